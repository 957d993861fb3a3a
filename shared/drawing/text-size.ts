/** Widths in em of a rounded sans at weight 600–800, on the wide side so that nothing runs over. */
const wideEm = 0.9
const upperEm = 0.72
const digitEm = 0.62
const lowerEm = 0.58
const narrowEm = 0.32

/** How much room a text takes before it is drawn; an estimate that errs wide. */
export function textWidthPx(text: string, sizePx: number): number {
  let em = 0
  for (const letter of text) {
    if (/[MWmw×]/.test(letter)) em += wideEm
    else if (/[A-Z]/.test(letter)) em += upperEm
    else if (/[ .,:;·'"°iIlj|!()/]/.test(letter)) em += narrowEm
    else if (/[0-9−–-]/.test(letter)) em += digitEm
    else em += lowerEm
  }
  return em * sizePx
}
