import type { Ground } from './build-pieces.ts'
import { isHipLike } from './piece.ts'
import type { Caution, CautionCode, Member } from './roof-types.ts'
import { at } from './slopes.ts'
import type { PlateEdge, Slope } from './slopes.ts'
import { birdsmouthShare } from './stand.ts'
import { cross2, degrees, dot2, radians } from './vector.ts'

const ending =
  'Sizes and tie-down are for span tables, local codes and a licensed engineer or builder; this program sets out timber, it does not size it.'

/** A hip may have this much less over its seat than its rafters before anybody minds; a drop alone is less. */
const hipSlackMm = 5
/** Tails that meet within this are level. */
const levelMm = 0.5
/** Unnotched overhang, as a share of the single span: AS 1684.2, as quoted by a secondary page. */
const overhangShare = 0.3
const bevelSlackDeg = 0.5

const whole = (mm: number): string => String(Math.round(mm))
const half = (deg: number): string => (Math.round(deg * 2) / 2).toFixed(1)

const caution = (code: CautionCode, members: Member[], text: string, remedy: string): Caution => ({
  code,
  members: members.map((m) => m.mark),
  text,
  remedy: `${remedy} ${ending}`,
})

/** One caution for all members that it concerns; none when there are none. */
const about = (
  code: CautionCode,
  members: Member[],
  text: (first: Member) => string,
  remedy: string,
): Caution[] => {
  const [first] = members
  return first === undefined ? [] : [caution(code, members, text(first), remedy)]
}

const isRafter = (member: Member): boolean =>
  member.role === 'common' || member.role === 'crown-end' || member.role === 'creeper'

const birdsmouthDeep = (members: Member[]): Caution[] =>
  about(
    'birdsmouth-deep',
    members.filter(
      (m) =>
        isRafter(m) &&
        m.birdsmouth !== null &&
        m.birdsmouth.depthMm > m.section.depthMm * birdsmouthShare + 0.01,
    ),
    (m) =>
      `The birdsmouth takes ${whole(m.birdsmouth?.depthMm ?? 0)} mm of a ${whole(m.section.depthMm)} mm rafter, more than a third of its depth (AS 1684.2, quoted second-hand).`,
    'Raise the height over plate, or use a deeper rafter.',
  )

const overSeatMm = (m: Member): number =>
  m.birdsmouth === null ? m.section.depthMm : m.birdsmouth.standMm * Math.cos(radians(m.pitchDeg))

const hipThin = (ground: Ground, standMm: number, members: Member[]): Caution[] => {
  const leastMm = (m: Member) =>
    Math.min(
      ...m.planes.map((p) => standMm * Math.cos(radians(at(ground.plates.slopes, p).pitchDeg))),
    )
  return about(
    'hip-thin-over-seat',
    members.filter((m) => m.role === 'hip' && overSeatMm(m) < leastMm(m) - hipSlackMm),
    (m) =>
      `Over its seat the hip has ${whole(overSeatMm(m))} mm of timber, its rafters have ${whole(leastMm(m))} mm (common practice, no source).`,
    'Use a deeper or thinner hip, or back it instead of lowering it.',
  )
}

/** Plumb cut of the rafters that bear on a ridge or hip, against its own plumb depth. */
const sectionShallow = (ground: Ground, members: Member[]): Caution[] => {
  const depthMm = ground.roof.sections.rafter.depthMm
  const plumbCutMm = (m: Member) =>
    Math.max(
      ...m.planes.map((p) => depthMm / Math.cos(radians(at(ground.plates.slopes, p).pitchDeg))),
    )
  const ownMm = (m: Member) => m.section.depthMm / Math.cos(radians(m.pitchDeg))
  const shallow = members.filter(
    (m) => (m.role === 'ridge' || isHipLike(m.role)) && ownMm(m) < plumbCutMm(m) - 0.01,
  )
  return ['ridge', 'hip'].flatMap((kind) =>
    about(
      'section-shallow',
      shallow.filter((m) => (m.role === 'ridge') === (kind === 'ridge')),
      (m) =>
        `The ${kind} is ${whole(ownMm(m))} mm deep plumb, the cut that bears on it ${whole(plumbCutMm(m))} mm (IRC R802.3, quoted second-hand).`,
      `Use a deeper ${kind}.`,
    ),
  )
}

const eavesNotLevel = (ground: Ground): Caution[] => {
  const { edges } = ground.plates
  return edges.flatMap((edge, k) => {
    const before = at(edges, k - 1)
    if (edge.finish === 'gable' || before.finish === 'gable') return []
    const fall = (e: typeof edge) => e.overhangMm * Math.tan(radians(e.pitchDeg))
    const step = fall(before) - fall(edge)
    if (Math.abs(step) <= levelMm) return []
    const level = fall(edge) / Math.tan(radians(before.pitchDeg))
    const otherWay = fall(before) / Math.tan(radians(edge.pitchDeg))
    return [
      caution(
        'eaves-not-level',
        [],
        `The eaves are not level at corner ${k + 1}: edge ${before.index + 1} hangs ${whole(Math.abs(step))} mm ${step > 0 ? 'lower' : 'higher'} than edge ${k + 1}.`,
        `An overhang of ${whole(level)} mm on edge ${before.index + 1}, or of ${whole(otherWay)} mm on edge ${k + 1}, levels them.`,
      ),
    ]
  })
}

const pastSaw = (ground: Ground, members: Member[]): Caution[] => {
  const worst = (m: Member) =>
    Math.max(...m.cuts.filter((c) => c.pastSaw).map((c) => c.bladeTiltDeg))
  return about(
    'past-saw',
    members.filter((m) => m.cuts.some((cut) => cut.pastSaw)),
    (m) =>
      `${m.mark} needs the blade at ${half(worst(m))}°, past the saw's ${half(ground.settings.sawMaxTiltDeg)}°.`,
    "Mark both faces and the top, cut it off square past the long point, then finish to the lines with a hand saw, or with the saw's base on the sawn end. Clamped, guard working, within the saw's manual.",
  )
}

const longerThanStock = (ground: Ground, members: Member[]): Caution[] => {
  const stockMm = ground.settings.longestStockMm
  return about(
    'longer-than-stock',
    members.filter((m) => m.cutLengthMm > stockMm + 1e-6),
    (m) => `${m.mark} is ${whole(m.cutLengthMm)} mm long, the longest stock ${whole(stockMm)} mm.`,
    'Order it long, or have a join over a support designed.',
  )
}

const lowPitch = (ground: Ground): Caution[] => {
  const { covering } = ground.settings
  if (covering === null) return []
  return ground.plates.slopes
    .filter((slope) => slope.pitchDeg < covering.minPitchDeg)
    .map((slope) =>
      caution(
        'pitch-below-covering',
        [],
        `Edge ${at(slope.edges, 0) + 1} is pitched at ${half(slope.pitchDeg)}°; ${covering.name} usually takes ${half(covering.minPitchDeg)}° and up.`,
        "Steepen the slope, choose another covering, or ask the covering's maker.",
      ),
    )
}

const longest = (members: Member[], of: (m: Member) => number): number =>
  Math.max(0, ...members.filter(isRafter).map(of))

const overhangLong = (ground: Ground, members: Member[]): Caution[] => {
  const spanMm = Math.min(
    longest(members, (m) => m.setOutLengthMm),
    ground.settings.maxRafterSpanMm,
  )
  return about(
    'overhang-long',
    members.filter((m) => isRafter(m) && m.tailLengthMm > overhangShare * spanMm + 1e-6),
    (m) =>
      `The tail of ${m.mark} is ${whole(m.tailLengthMm)} mm along the rafter, over 30 % of a span of ${whole(spanMm)} mm (AS 1684.2, quoted second-hand).`,
    'Shorten the overhang or have the tails designed.',
  )
}

const spanLong = (ground: Ground, members: Member[]): Caution[] =>
  about(
    'rafter-span-long',
    members.filter((m) => isRafter(m) && m.setOutLengthMm > ground.settings.maxRafterSpanMm),
    (m) =>
      `${m.mark} spans ${whole(m.setOutLengthMm)} mm from plate to head, over the ${whole(ground.settings.maxRafterSpanMm)} mm set for one span.`,
    'Underpurlins or a deeper rafter will be wanted; they are not set out here.',
  )

/** Edge bevel across a backed top, whichever top the hip has. */
const backedEdgeDeg = (hip: Member, cut: Member['cuts'][number]): number =>
  (hip.backing === null ? (cut.edgeOtherTop ?? cut.edge) : cut.edge).fromEdgeDeg

/** What an octagonal end, or a splay at 45°, has at its corners; the short cut is known for no other. */
const splayCornerDeg = 135
const cornerSlackDeg = 0.5

const interiorDeg = (before: PlateEdge, after: PlateEdge): number =>
  180 - degrees(Math.atan2(cross2(before.along, after.along), dot2(before.along, after.along)))

/**
 * Whether a slope is a side of an octagonal or splayed end: both its corners at 135°, and the slopes
 * round them of its own pitch.
 */
const isSplaySide = (ground: Ground, slope: Slope): boolean => {
  const { edges } = ground.plates
  const [first, last] = [at(slope.edges, 0), at(slope.edges, slope.edges.length - 1)]
  const [before, after] = [at(edges, first - 1), at(edges, last + 1)]
  if (before.finish === 'gable' || after.finish === 'gable') return false
  if (before.pitchDeg !== slope.pitchDeg || after.pitchDeg !== slope.pitchDeg) return false
  const corners = [interiorDeg(before, at(edges, first)), interiorDeg(at(edges, last), after)]
  return corners.every((deg) => Math.abs(deg - splayCornerDeg) < cornerSlackDeg)
}

type Miss = { crown: Member; exact: number; short: number; gapMm: number }

/** Where the short cut misses a diagonal crown end by over half a degree; null where it does not. */
const shortcutMiss = (crown: Member, members: Member[]): Miss | null => {
  const heads = crown.cuts.filter((cut) => cut.end === 'head' && cut.longSide !== 'none')
  const [first, second] = heads
  if (crown.role !== 'crown-end' || first === undefined || second === undefined) return null
  const exact = first.edge.fromEdgeDeg
  if (Math.abs(exact - second.edge.fromEdgeDeg) > bevelSlackDeg) return null
  const [backed] = members
    .filter((m) => m.role === 'hip' && m.planes.some((p) => crown.planes.includes(p)))
    .flatMap((hip) =>
      hip.cuts.filter((c) => c.against === crown.mark).map((c) => backedEdgeDeg(hip, c)),
    )
  if (backed === undefined || Math.abs(exact - 2 * backed) <= bevelSlackDeg) return null
  const short = 2 * backed
  const acrossMm = crown.section.thicknessMm / 2 / Math.sin(radians(exact))
  const gapMm = acrossMm * Math.tan(radians(Math.abs(exact - short)))
  return { crown, exact, short, gapMm }
}

/**
 * Common practice (no source) takes a diagonal crown end's edge bevel at an octagonal or splayed end as
 * twice the backed hip's beside it; where that is over half a degree out, says what it would cost at
 * the joint.
 */
const crownShortcut = (ground: Ground, members: Member[]): Caution[] => {
  const misses = members.flatMap((crown) => {
    const [plane] = crown.planes
    if (plane === undefined || !isSplaySide(ground, at(ground.plates.slopes, plane))) return []
    return shortcutMiss(crown, members) ?? []
  })
  const [first] = misses
  if (first === undefined) return []
  const text =
    `Twice the backed hip's edge bevel would give ${first.crown.mark} ${first.short.toFixed(2)}° from the edge; ` +
    `the joint wants ${first.exact.toFixed(2)}°. The short cut leaves ${first.gapMm.toFixed(1)} mm open at the joint.`
  const remedy = 'Mark the edge bevel given here (the short cut is common practice, no source).'
  const crowns = misses.map((m) => m.crown)
  return [caution('crown-bevel-shortcut', crowns, text, remedy)]
}

/** Where many lines meet at odd angles no order of joints closes every head; better said than hidden. */
const jointOpen = (members: Member[], openMarks: ReadonlySet<string | undefined>): Caution[] =>
  about(
    'joint-open',
    members.filter((m) => openMarks.has(m.mark)),
    (m) => `The head of ${m.mark} does not close on its neighbours by any usual order of joints.`,
    'Set that joint out full size on the deck before cutting, or change the plan so that fewer lines meet there.',
  )

/** All cautions of a frame, in a fixed order; each says what is wrong and what would answer it. */
export const cautionsOf = (
  ground: Ground,
  standMm: number,
  members: Member[],
  openMarks: ReadonlySet<string | undefined>,
): Caution[] => [
  ...birdsmouthDeep(members),
  ...hipThin(ground, standMm, members),
  ...sectionShallow(ground, members),
  ...eavesNotLevel(ground),
  ...pastSaw(ground, members),
  ...longerThanStock(ground, members),
  ...lowPitch(ground),
  ...overhangLong(ground, members),
  ...spanLong(ground, members),
  ...crownShortcut(ground, members),
  ...jointOpen(members, openMarks),
]
