/** Opens the phone's own dialler. */
export function telephoneHref(phone: string): string {
  return `tel:${phone.replaceAll(/[^0-9+]/g, '')}`
}

/** An open map of the address, for whichever map the device likes. */
export function mapHref(address: string): string {
  return `https://www.openstreetmap.org/search?query=${encodeURIComponent(address)}`
}
