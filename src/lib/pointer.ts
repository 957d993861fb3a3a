/** A finger: putting the cursor into a field unasked would bring the keyboard up over the page. */
export function isTouched(): boolean {
  return window.matchMedia('(pointer: coarse)').matches
}
