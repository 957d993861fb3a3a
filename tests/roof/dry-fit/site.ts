import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import { plateFlat, plateSolid } from './plates.ts'
import { rebuildMember, type Piece } from './rebuild-member.ts'
import type { Flat, Solid, SolidKit } from './solid-kit.ts'
import { surfaceOf, type Surface } from './surface.ts'

/** What a firm sets and a spec must answer to. */
export type JudgeSettings = {
  sawMaxTiltDeg: number
  densityKgM3: number
  minCreeperMm: number
  roundMm: number
  roundDeg: number
}

/** As agreed for a firm without settings of its own, written out again here. */
export const plainSettings: JudgeSettings = {
  sawMaxTiltDeg: 50,
  densityKgM3: 550,
  minCreeperMm: 300,
  roundMm: 1,
  roundDeg: 0.5,
}

/** The frame stood up: plates and every member sawn again, ready to be judged. */
export type Site = {
  kit: SolidKit
  roof: Roof
  spec: FrameSpec
  settings: JudgeSettings
  surface: Surface
  ring: Flat
  plates: Solid
  pieces: Piece[]
}

export function standUp(
  kit: SolidKit,
  roof: Roof,
  spec: FrameSpec,
  settings: JudgeSettings = plainSettings,
): Site {
  const surface = surfaceOf(roof, spec)
  const ring = plateFlat(kit, roof)
  const plates = plateSolid(ring)
  const pieces = spec.members.map((member) => rebuildMember(kit, member, surface.slopes))
  return { kit, roof, spec, settings, surface, ring, plates, pieces }
}

/** Gives the library its memory back. */
export function takeDown(site: Site): void {
  for (const piece of site.pieces) piece.solid.delete()
  site.plates.delete()
  site.ring.delete()
}
