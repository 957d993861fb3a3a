/** '11 13/16' as a number. */
export function inches(text: string): number {
  return text
    .split(' ')
    .map((part) => part.split('/').map(Number))
    .reduce((sum, [over, under = 1]) => sum + over! / under, 0)
}
