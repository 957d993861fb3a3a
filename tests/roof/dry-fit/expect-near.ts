import type { Piece } from './rebuild-member.ts'
import type { Complain, Complaint } from './report.ts'

/** The spec is exact, so what it says twice must agree to a hundredth of a millimetre. */
export const LENGTH_TOL_MM = 0.01
export const ANGLE_TOL_DEG = 0.001

export function expectNear(
  complain: Complain,
  piece: Piece,
  check: Complaint['check'],
  name: string,
  published: number,
  rebuilt: number,
  tolerance: number,
): void {
  const out = published - rebuilt
  if (Math.abs(out) <= tolerance) return
  const text = `${name} is given as ${published.toFixed(4)}, the timber has ${rebuilt.toFixed(4)}`
  complain({ check, marks: [piece.member.mark], out, text })
}
