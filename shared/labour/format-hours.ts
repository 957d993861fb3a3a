/** Minutes as hours to read at a glance: '15.5 h', '16 h', '45 min' under an hour. */
export function formatHours(minutes: number): string {
  const whole = Math.round(minutes)
  return whole > 0 && whole < 60 ? `${whole} min` : `${hoursNumber(whole)} h`
}

/** Planned against there: '15.5 of 16 h'. */
export function formatLoad(plannedMinutes: number, availableMinutes: number): string {
  return `${hoursNumber(plannedMinutes)} of ${hoursNumber(availableMinutes)} h`
}

function hoursNumber(minutes: number): string {
  return String(Math.round(minutes / 6) / 10)
}

/** Whole hours and quarters, as said on site: 495 → '8¼ h'. */
export function formatQuarters(minutes: number): string {
  const quarters = Math.round(minutes / 15)
  const hours = Math.floor(quarters / 4)
  const fraction = ['', '¼', '½', '¾'][quarters % 4] ?? ''
  return `${hours > 0 || fraction === '' ? hours : ''}${fraction} h`
}
