const proof = process.env['PROOF'] === '1'

/** How many of a long list a test takes: a sample with `npm test`, the whole with `npm run proof`. */
export const sampleOf = (few: number, whole: number): number => (proof ? whole : few)
