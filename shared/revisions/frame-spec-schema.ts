import { z } from 'zod'
import type { FrameSpec, Roof, RoofSettings } from '../roof/roof-types.ts'

/** The shapes of shared/roof/roof-types.ts as they travel; the types there remain the one vocabulary. */

const point2 = z.object({ x: z.number(), y: z.number() })
const point3 = z.object({ x: z.number(), y: z.number(), z: z.number() })
const section = z.object({ thicknessMm: z.number(), depthMm: z.number() })
const angle = z.object({ fromEdgeDeg: z.number(), fromSquareDeg: z.number() })
const hand = z.enum(['left', 'right'])
const roleNames = [
  'ridge',
  'common',
  'crown-end',
  'hip',
  'broken-hip',
  'valley',
  'creeper',
  'valley-creeper',
  'cripple-creeper',
  'underpurlin',
  'collar-tie',
  'fascia',
  'barge',
] as const
export const memberRoleSchema = z.enum(roleNames)

export const roofSchema = z.object({
  outline: z.array(point2),
  edges: z.array(
    z.discriminatedUnion('finish', [
      z.object({ finish: z.literal('eave'), pitchDeg: z.number(), overhangMm: z.number() }),
      z.object({ finish: z.literal('gable'), overhangMm: z.number() }),
    ]),
  ),
  plateWidthMm: z.number(),
  maxSpacingMm: z.number(),
  spacing: z.enum(['even', 'full']),
  sections: z.object({
    rafter: section,
    hip: section,
    valley: section,
    ridge: section,
    underpurlin: section.optional(),
    collarTie: section.optional(),
    fascia: section.optional(),
    barge: section.optional(),
  }),
  tail: z.enum(['plumb', 'square']),
  tailAllowanceMm: z.number(),
  hipTop: z.enum(['backed', 'lowered']),
  valleyTop: z.enum(['square', 'dished']),
  standMm: z.number().optional(),
  collarTieHeightMm: z.number().optional(),
}) satisfies z.ZodType<Roof>

export const roofSettingsSchema = z.object({
  sawMaxTiltDeg: z.number(),
  minCreeperMm: z.number(),
  longestStockMm: z.number(),
  densityKgM3: z.number(),
  roundMm: z.number(),
  roundDeg: z.number(),
  maxRafterSpanMm: z.number(),
  covering: z.object({ name: z.string(), minPitchDeg: z.number() }).nullable(),
  collarTieSpacingMm: z.number().optional(),
  battenGaugeMm: z.number().optional(),
}) satisfies z.ZodType<RoofSettings>

const cut = z.object({
  end: z.enum(['head', 'foot', 'tail']),
  plane: z.object({ point: point3, normal: point3 }),
  against: z.string().nullable(),
  alsoAgainst: z.array(z.string()),
  alongMm: z.number(),
  longSide: z.enum(['left', 'right', 'none']),
  longPointFromHeelMm: z.number(),
  shortPointFromHeelMm: z.number(),
  face: angle,
  edge: angle,
  edgeOtherTop: angle.nullable(),
  bladeTiltDeg: z.number(),
  pastSaw: z.boolean(),
})

const birdsmouth = z.object({
  seatMm: z.number(),
  heelMm: z.number(),
  depthMm: z.number(),
  standMm: z.number(),
  bearingMm: z.number(),
  heelOffsetMm: z.number(),
  seatFromEdgeDeg: z.number(),
  heelFromEdgeDeg: z.number(),
})

const member = z.object({
  mark: z.string(),
  role: memberRoleSchema,
  topInSlope: z.boolean().optional(),
  hand: hand.nullable(),
  section,
  axis: z.object({ from: point3, to: point3 }),
  riseMm: z.number(),
  runMm: z.number(),
  pitchDeg: z.number(),
  setOutLengthMm: z.number(),
  headDeductionMm: z.number(),
  footDeductionMm: z.number(),
  tailLengthMm: z.number(),
  cutLengthMm: z.number(),
  cuts: z.array(cut),
  birdsmouth: birdsmouth.nullable(),
  backing: z.object({ leftDeg: z.number(), rightDeg: z.number() }).nullable(),
  dropMm: z.number(),
  planes: z.array(z.number()),
  weightKg: z.number(),
})

const line = z.object({
  kind: z.enum(['ridge', 'hip', 'valley', 'broken-hip', 'verge', 'eave']),
  from: point3,
  to: point3,
  planLengthMm: z.number(),
  trueLengthMm: z.number(),
  pitchDeg: z.number(),
  planes: z.array(z.number()),
  dihedralDeg: z.number().optional(),
})

const cautionCodes = [
  'birdsmouth-deep',
  'hip-thin-over-seat',
  'section-shallow',
  'eaves-not-level',
  'past-saw',
  'longer-than-stock',
  'pitch-below-covering',
  'overhang-long',
  'crown-bevel-shortcut',
  'rafter-span-long',
  'joint-open',
  'tail-touches',
  'collar-tie-moved',
  'eaves-meet',
] as const

export const frameSpecSchema = z.object({
  standMm: z.number(),
  planes: z.array(
    z.object({
      edges: z.array(z.number()),
      pitchDeg: z.number(),
      areaM2: z.number(),
      areaWithEavesM2: z.number(),
      polygon: z.array(point3),
    }),
  ),
  lines: z.array(line),
  members: z.array(member),
  cutLines: z.array(
    z.object({
      mark: z.string(),
      role: memberRoleSchema,
      section,
      cutLengthMm: z.number(),
      quantity: z.number(),
      left: z.number(),
      right: z.number(),
      members: z.array(z.string()),
    }),
  ),
  totals: z.object({
    roofAreaM2: z.number(),
    roofAreaWithEavesM2: z.number(),
    ridgeMm: z.number(),
    hipMm: z.number(),
    valleyMm: z.number(),
    eaveMm: z.number(),
    vergeMm: z.number(),
    bySection: z.array(
      z.object({ section, pieces: z.number(), lengthMm: z.number(), weightKg: z.number() }),
    ),
    covering: z
      .object({
        coveringAreaM2: z.number(),
        underlayAreaM2: z.number(),
        battenMm: z.number().nullable(),
        ridgeCappingMm: z.number(),
        hipCappingMm: z.number(),
        valleyLiningMm: z.number(),
        gutterMm: z.number(),
        fasciaMm: z.number(),
        bargeMm: z.number(),
      })
      .optional(),
  }),
  cautions: z.array(
    z.object({
      code: z.enum(cautionCodes),
      members: z.array(z.string()),
      text: z.string(),
      remedy: z.string(),
      answers: z
        .array(z.object({ path: z.string(), value: z.number(), unit: z.enum(['mm', 'deg']) }))
        .optional(),
    }),
  ),
  planing: z.array(
    z.object({ mark: z.string(), end: z.enum(['head', 'foot']), side: hand, offMm: z.number() }),
  ),
  rounding: z.object({ worstMm: z.number(), joint: z.tuple([z.string(), z.string()]).nullable() }),
}) satisfies z.ZodType<FrameSpec>
