/**
 * Only our own addresses: a link from elsewhere must not send people away after sign-in. Browsers drop tabs
 * and line ends from an address and read a backslash as a slash, so one with any of them is not followed.
 */
export function wayBack(to: string | null): string {
  return to && /^\/(?!\/)[^\\\p{Cc}]*$/u.test(to) ? to : '/'
}
