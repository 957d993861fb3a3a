/** Opens the phone's own messages with the words in place (RFC 5724; the body as both kinds of phone read it). */
export function smsHref({ phone, words }: { phone: string; words: string }): string {
  return `sms:${phone.replaceAll(/[^0-9+]/g, '')}?body=${encodeURIComponent(words)}`
}
