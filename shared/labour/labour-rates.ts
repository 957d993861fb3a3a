import type { MemberRole } from '../roof/roof-types.ts'
import type { PackageKey } from './work-step.ts'

/** Minutes of one person for one piece. */
export type PieceMinutes = { cutMinutes: number; standMinutes: number }

/** A firm's labour settings; the day logs correct them later. */
export type LabourRates = {
  pieces: Record<MemberRole, PieceMinutes>
  /** Checking sides and diagonals, marking the rafter positions: once, plus so much a metre of plate. */
  setOutMinutes: number
  setOutMinutesPerPlateM: number
  /** Cutting and trying the first pair. */
  firstPairMinutes: number
  /** Bracing the ridge on its centring pairs, a ridge. */
  braceRidgeMinutes: number
  /** Bringing tails and fascia to a line, a metre of eave. */
  tailLineMinutesPerEaveM: number
  /** Setting up for a package (trestles, saw, ladders), once, whatever its pieces. */
  packageMinutes: Record<PackageKey, number>
  /** Of each person at the start of each day (unloading, toolbox talk): not there for the work. */
  startUpMinutes: number
}
