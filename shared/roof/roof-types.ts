/**
 * The vocabulary of a roof: what is typed in, and what the set-out gives back.
 *
 * Lengths are millimetres, angles degrees, areas square metres, weights kilograms; the names say so.
 * z = 0 is the top of the plate. x, y are plan coordinates, counter-clockwise outlines.
 */

export type Point2 = { x: number; y: number }
export type Point3 = { x: number; y: number; z: number }

export type Section = { thicknessMm: number; depthMm: number }

/** One plate edge; edge i runs from corner i to corner i + 1. */
export type RoofEdge =
  { finish: 'eave'; pitchDeg: number; overhangMm: number } | { finish: 'gable'; overhangMm: number }

/** The timbers of the frame; the others are set out where a size is typed for them. */
export type RoofSections = {
  rafter: Section
  hip: Section
  valley: Section
  ridge: Section
  underpurlin?: Section | undefined
  collarTie?: Section | undefined
  fascia?: Section | undefined
  barge?: Section | undefined
}

/** What is entered for a roof; a revision stores it with its settings. */
export type Roof = {
  /** Corners of the outer plate face in plan, counter-clockwise, 3 to 64 of them. */
  outline: Point2[]
  edges: RoofEdge[]
  plateWidthMm: number
  maxSpacingMm: number
  spacing: 'even' | 'full'
  sections: RoofSections
  tail: 'plumb' | 'square'
  /** Left long at the tail and cut to a line on site; part of `cutLengthMm`. */
  tailAllowanceMm: number
  hipTop: 'backed' | 'lowered'
  valleyTop: 'square' | 'dished'
  /** Height over plate; worked out from the sections when absent. */
  standMm?: number | undefined
  /** Plumb height of the collar ties' underside over the plate; in the upper third of the rise when absent. */
  collarTieHeightMm?: number | undefined
}

/** What a covering usually takes, for a caution only. */
export type Covering = { name: string; minPitchDeg: number }

export type RoofSettings = {
  /** How far the saw's blade tilts. */
  sawMaxTiltDeg: number
  /** Creepers with a set-out length under this are left out. */
  minCreeperMm: number
  longestStockMm: number
  densityKgM3: number
  /** What the tape and the bevel are marked to. */
  roundMm: number
  roundDeg: number
  maxRafterSpanMm: number
  covering: Covering | null
  /** Collar ties stand no further apart than this; 1200 when absent. */
  collarTieSpacingMm?: number | undefined
  /** From batten to batten up the slope; no battens are counted when absent. */
  battenGaugeMm?: number | undefined
}

export type MemberRole =
  | 'ridge'
  | 'common'
  | 'crown-end'
  | 'hip'
  | 'broken-hip'
  | 'valley'
  | 'creeper'
  | 'valley-creeper'
  | 'cripple-creeper'
  | 'underpurlin'
  | 'collar-tie'
  | 'fascia'
  | 'barge'

export type LineKind = 'ridge' | 'hip' | 'valley' | 'broken-hip' | 'verge' | 'eave'

/** Every angle both ways; the two sum to 90. */
export type Angle = { fromEdgeDeg: number; fromSquareDeg: number }

/** One slope: one eave, or neighbouring collinear eaves of equal pitch. */
export type RoofPlane = {
  /** Plate edges it rises from. */
  edges: number[]
  pitchDeg: number
  /** To the plate line. */
  areaM2: number
  areaWithEavesM2: number
  /** To the plate line, counter-clockwise in plan, in the set-out plane. */
  polygon: Point3[]
}

/** A set-out line of the roof; it runs node to node in the set-out planes. */
export type RoofLine = {
  kind: LineKind
  from: Point3
  to: Point3
  planLengthMm: number
  trueLengthMm: number
  pitchDeg: number
  /** Indexes into `FrameSpec.planes`: one for a verge or an eave, two otherwise. */
  planes: number[]
  dihedralDeg?: number | undefined
}

/** A saw cut: where it is, what it bears on, and how it is marked and sawn. */
export type Cut = {
  end: 'head' | 'foot' | 'tail'
  /** The true plane of the cut in space; the normal points off the member. */
  plane: { point: Point3; normal: Point3 }
  /** Mark of the piece with most bearing. */
  against: string | null
  alsoAgainst: string[]
  /** Where the plane crosses the top-edge centre line, from `axis.from`. */
  alongMm: number
  /** Side of the long point, looking from foot to head with the top edge up. */
  longSide: 'left' | 'right' | 'none'
  /** Along the top arrises, from the heel plumb line; under 0 below it, towards the tail, like `alongMm`. */
  longPointFromHeelMm: number
  shortPointFromHeelMm: number
  /** On the side face: from the arris towards the foot to the line down the face; over 90 allowed. */
  face: Angle
  /**
   * Across the top, at the long point: from the arris running into the timber. Over 90 only where a
   * backed top turns a nearly square cut past square.
   */
  edge: Angle
  /** For a hip: the edge bevel of the other kind of top (backed where this one is square, and so on). */
  edgeOtherTop: Angle | null
  /** From square, the saw base on the side face and the blade following the marked line. */
  bladeTiltDeg: number
  pastSaw: boolean
}

export type Birdsmouth = {
  seatMm: number
  heelMm: number
  /** Square to the edge. */
  depthMm: number
  standMm: number
  /** What lies on the plate. */
  bearingMm: number
  /** A valley's heel stands this far out along the valley to clear both plate faces; 0 otherwise. */
  heelOffsetMm: number
  seatFromEdgeDeg: number
  heelFromEdgeDeg: number
}

export type Member = {
  /** Unique, short, painted on the timber. Alike pieces share the mark of their `CutLine`'s stem. */
  mark: string
  role: MemberRole
  /** Its top lies in the slope `planes[0]`, square to it (underpurlins, canted fascias); else its sides are plumb. */
  topInSlope?: boolean | undefined
  /** Side of the head's long point, looking from foot to head, top edge up; null when central. */
  hand: 'left' | 'right' | null
  section: Section
  /** Top-edge centre line: `from` on the heel plumb line, `to` over the centre of what the head meets. */
  axis: { from: Point3; to: Point3 }
  riseMm: number
  runMm: number
  pitchDeg: number
  setOutLengthMm: number
  headDeductionMm: number
  footDeductionMm: number
  tailLengthMm: number
  /** Longest point to longest point, tail allowance included: what the saw needs and the yard sells. */
  cutLengthMm: number
  cuts: Cut[]
  birdsmouth: Birdsmouth | null
  backing: { leftDeg: number; rightDeg: number } | null
  dropMm: number
  /** Indexes into `FrameSpec.planes`. */
  planes: number[]
  weightKg: number
}

/** Pieces alike within 0.1 mm and 0.01°: one line of the cut list. */
export type CutLine = {
  mark: string
  role: MemberRole
  section: Section
  cutLengthMm: number
  quantity: number
  left: number
  right: number
  /** Marks of its members. */
  members: string[]
}

export type SectionTotal = { section: Section; pieces: number; lengthMm: number; weightKg: number }

export type RoofTotals = {
  roofAreaM2: number
  roofAreaWithEavesM2: number
  ridgeMm: number
  hipMm: number
  valleyMm: number
  eaveMm: number
  vergeMm: number
  bySection: SectionTotal[]
  /** What covers and trims the roof; specs of engine version 2 lack it. */
  covering?: CoveringTotals | undefined
}

/** Net measures: laps and waste are for the merchant's usual allowance. */
export type CoveringTotals = {
  /** On the slopes, out to the tail lines and the verge lines. */
  coveringAreaM2: number
  /** The same surface; laps not counted. */
  underlayAreaM2: number
  /** Covering area over the batten gauge, slope by slope; null without a gauge. */
  battenMm: number | null
  /** Ridges, out to the verge lines. */
  ridgeCappingMm: number
  /** Hips and broken hips, hips down to the nearer of the two tail lines. */
  hipCappingMm: number
  /** Valleys, down to the further of the two tail lines. */
  valleyLiningMm: number
  /** Along the tail lines of all eaves (the fascia's back), corner to corner and out to the verge lines. */
  gutterMm: number
  /** Cut lengths of the fascia boards; without boards, as the gutters. */
  fasciaMm: number
  /** Cut lengths of the barge boards; without boards, the verges from tail line to apex along the slope. */
  bargeMm: number
}

export type CautionCode =
  | 'birdsmouth-deep'
  | 'hip-thin-over-seat'
  | 'section-shallow'
  | 'eaves-not-level'
  | 'past-saw'
  | 'longer-than-stock'
  | 'pitch-below-covering'
  | 'overhang-long'
  | 'crown-bevel-shortcut'
  | 'rafter-span-long'
  | 'joint-open'
  | 'tail-touches'
  | 'collar-tie-moved'
  | 'eaves-meet'

/** A value of a field of `Roof` that would answer a caution; which one, or none, is for a person to type. */
export type CautionAnswer = { path: string; value: number; unit: 'mm' | 'deg' }

export type Caution = {
  code: CautionCode
  members: string[]
  text: string
  /** What would answer it; a size is always typed by a person. */
  remedy: string
  /** The same by field, so that it can stand beside it; least values, not choices. */
  answers?: CautionAnswer[] | undefined
}

/** A top corner that stands over a neighbouring slope: plane it off by this much. */
export type Planing = { mark: string; end: 'head' | 'foot'; side: 'left' | 'right'; offMm: number }

export type FrameSpec = {
  standMm: number
  planes: RoofPlane[]
  lines: RoofLine[]
  members: Member[]
  cutLines: CutLine[]
  totals: RoofTotals
  cautions: Caution[]
  planing: Planing[]
  /** Worst joint error when every number is marked to `roundMm` and `roundDeg`. */
  rounding: { worstMm: number; joint: [string, string] | null }
}

/**
 * One thing wrong with a roof as typed, at its field.
 * `path` is the field's path in `Roof` ('edges.2.pitchDeg', 'outline.3', 'sections.rafter.depthMm').
 */
export type RoofProblem = { path: string; message: string }
