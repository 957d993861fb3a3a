import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import { defaultSettings } from '../../../shared/roof/roof-settings.ts'
import type {
  Cut,
  FrameSpec,
  Member,
  MemberRole,
  Roof,
  RoofSections,
  RoofSettings,
} from '../../../shared/roof/roof-types.ts'

/** Sizes for the timbers beside the frame; common ones, no source. */
export const besideSizes = {
  underpurlin: { thicknessMm: 75, depthMm: 150 },
  collarTie: { thicknessMm: 35, depthMm: 90 },
  fascia: { thicknessMm: 30, depthMm: 190 },
  barge: { thicknessMm: 30, depthMm: 190 },
} as const satisfies Partial<RoofSections>

type Kind = keyof typeof besideSizes

/** The roof with sizes typed for some of the timbers beside the frame. */
export function withSizes(roof: Roof, ...kinds: Kind[]): Roof {
  const sizes = Object.fromEntries(kinds.map((kind) => [kind, besideSizes[kind]]))
  return { ...roof, sections: { ...roof.sections, ...sizes } }
}

export const framed = (roof: Roof, settings: Partial<RoofSettings> = {}): FrameSpec =>
  frameRoof(roof, { ...defaultSettings, ...settings })

export const membersOf = (spec: FrameSpec, role: MemberRole): Member[] =>
  spec.members.filter((m) => m.role === role)

export const endOf = (member: Member, end: Cut['end']): Cut => {
  const cut = member.cuts.find((c) => c.end === end)
  if (cut === undefined) throw new Error(`${member.mark} has no ${end} cut`)
  return cut
}

export const rad = (deg: number): number => (deg * Math.PI) / 180
export const deg = (radians: number): number => (radians * 180) / Math.PI
export const tan = (degrees: number): number => Math.tan(rad(degrees))
export const sin = (degrees: number): number => Math.sin(rad(degrees))
export const cos = (degrees: number): number => Math.cos(rad(degrees))

/** An L: a 12 × 6 m body with a wing 5 m wide, 4 m out from its front, at its left end. */
export const lPlan = [
  [0, 0],
  [5000, 0],
  [5000, 4000],
  [12_000, 4000],
  [12_000, 10_000],
  [0, 10_000],
] as const
