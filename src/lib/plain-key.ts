/** Whether a key was pressed on the page itself: not while typing, not in a dialog, not with Ctrl, Cmd or Alt. */
export function isPlainKey(event: KeyboardEvent, key: string): boolean {
  if (event.key !== key || event.ctrlKey || event.metaKey || event.altKey) return false
  const { target } = event
  if (!(target instanceof HTMLElement)) return true
  if (target.matches('input, textarea, select, [contenteditable]')) return false
  return document.querySelector('[role="dialog"], [role="menu"]') === null
}
