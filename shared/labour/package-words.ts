import { type PackageKey, packageKeys } from './work-step.ts'

const words: Record<PackageKey, string> = {
  'set-out-plates': 'set out plates',
  'first-pair': 'first pair',
  'cut-commons': 'cut commons',
  ridge: 'ridge',
  'crown-ends': 'crown ends',
  hips: 'hips',
  'remaining-commons': 'commons up',
  creepers: 'creepers',
  purlins: 'purlins and ties',
  tails: 'fascia and tails',
}

function isPackageKey(key: string): key is PackageKey {
  return (packageKeys as readonly string[]).includes(key)
}

/** What a day holds in a few words: 'Set out plates to ridge', 'Hips, creepers'; '' when it holds nothing. */
export function packagesInWords(keys: readonly string[]): string {
  const held = packageKeys.filter((key) => keys.some((k) => isPackageKey(k) && k === key))
  const [first, second] = held
  const last = held[held.length - 1]
  if (!first || !last) return ''
  const text =
    held.length === 1
      ? words[first]
      : held.length === 2 && second
        ? `${words[first]}, ${words[second]}`
        : `${words[first]} to ${words[last]}`
  return text.charAt(0).toUpperCase() + text.slice(1)
}
