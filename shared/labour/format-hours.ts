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
