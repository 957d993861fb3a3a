/** Plate widths that make `troubled-frame-thread.ts` fail, each in its own way. */
export const trouble = { endless: '71', dies: '72', throws: '73', eatsMemory: '74' }
