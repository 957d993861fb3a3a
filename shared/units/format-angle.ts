/** Degrees to the half degree, as a bevel is set: 41.93 → '42.0°'. */
export function formatAngle(angleDeg: number, stepDeg = 0.5): string {
  if (!Number.isFinite(angleDeg)) return '–'
  const roundedDeg = Math.round(Math.abs(angleDeg) / stepDeg) * stepDeg
  const sign = roundedDeg > 0 && angleDeg < 0 ? '−' : ''
  return `${sign}${roundedDeg.toFixed(1)}°`
}
