import type { Ground } from './build-pieces.ts'
import { cautionAbout, cautionOf, halfDeg, isRafter, tenthMm, wholeMm } from './caution-words.ts'
import type { Caution, CautionAnswer, Member } from './roof-types.ts'
import { eavesThatMeet } from './secondary/tail-lines.ts'
import { at } from './slopes.ts'
import type { PlateEdge } from './slopes.ts'
import { cross2, radians } from './vector.ts'

/** Tails that meet within this are level. */
const levelMm = 0.5
/** Unnotched overhang, as a share of the single span: AS 1684.2, as quoted by a secondary page. */
const overhangShare = 0.3
/** The longest overhang that can be typed. */
const mostOverhangMm = 3000

const overhang = (edge: number, value: number): CautionAnswer[] =>
  value > 0 && value <= mostOverhangMm
    ? [{ path: `edges.${edge}.overhangMm`, value, unit: 'mm' }]
    : []

const fallMm = (edge: PlateEdge): number => edge.overhangMm * Math.tan(radians(edge.pitchDeg))

/** The overhang at which an eave falls as far as its neighbour: whole millimetres where those are level enough. */
const levelOverhangMm = (fall: number, pitchDeg: number): number => {
  const tan = Math.tan(radians(pitchDeg))
  const whole = Math.round(fall / tan)
  return Math.abs(whole * tan - fall) <= levelMm ? whole : tenthMm(fall / tan)
}

const unlevelAt = (before: PlateEdge, edge: PlateEdge): Caution[] => {
  if (edge.finish === 'gable' || before.finish === 'gable') return []
  const step = fallMm(before) - fallMm(edge)
  if (Math.abs(step) <= levelMm) return []
  const level = levelOverhangMm(fallMm(edge), before.pitchDeg)
  const otherWay = levelOverhangMm(fallMm(before), edge.pitchDeg)
  const corner = cross2(before.along, edge.along) < 0 ? 'inward corner' : 'corner'
  const [first, second] = [before.index + 1, edge.index + 1]
  return [
    cautionOf(
      'eaves-not-level',
      [],
      `The eaves are not level at ${corner} ${second}: edge ${first} hangs ${wholeMm(Math.abs(step))} mm ${step > 0 ? 'lower' : 'higher'} than edge ${second}.`,
      `An overhang of ${level} mm on edge ${first}, or of ${otherWay} mm on edge ${second}, levels them.`,
      [...overhang(before.index, level), ...overhang(edge.index, otherWay)],
    ),
  ]
}

/** Eaves that do not meet at one height, at outward and inward corners alike. */
export const eavesNotLevel = (ground: Ground): Caution[] => {
  const { edges } = ground.plates
  return edges.flatMap((edge, k) => unlevelAt(at(edges, k - 1), edge))
}

/** Eaves that meet over a recess: no boards or gutters go between them. */
export const eavesMeet = (ground: Ground): Caution[] => {
  const { plates, roof } = ground
  const boardMm = roof.sections.fascia?.thicknessMm ?? 0
  return eavesThatMeet(plates, boardMm).map((k) => {
    const sides = [at(plates.edges, k - 1), at(plates.edges, k + 1)]
    const most = Math.floor(at(plates.edges, k).lengthMm / 2 - boardMm)
    const answers = sides
      .filter((edge) => edge.overhangMm > most)
      .flatMap((edge) => overhang(edge.index, most))
    const [a, b] = sides.map((edge) => edge.index + 1)
    return cautionOf(
      'eaves-meet',
      [],
      `The eaves of edges ${a} and ${b} meet over edge ${k + 1}: no ${boardMm > 0 ? 'fascia or gutter' : 'gutter'} goes between them, and none is set out there.`,
      most > 0
        ? `Overhangs of at most ${most} mm on both leave room for the boards alone; a gutter needs more.`
        : 'Widen the recess, or carry the roof across it.',
      answers,
    )
  })
}

const longest = (members: Member[], of: (m: Member) => number): number =>
  Math.max(0, ...members.filter(isRafter).map(of))

/** Tails long for the span behind them, with the overhang that would not be, edge by edge. */
export const overhangLong = (ground: Ground, members: Member[]): Caution[] => {
  const spanMm = Math.min(
    longest(members, (m) => m.setOutLengthMm),
    ground.settings.maxRafterSpanMm,
  )
  const mostMm = overhangShare * spanMm
  const long = members.filter((m) => isRafter(m) && m.tailLengthMm > mostMm + 1e-6)
  const planes = new Set(long.flatMap((m) => m.planes))
  const answers = [...planes].flatMap((p) => {
    const slope = at(ground.plates.slopes, p)
    const most = Math.floor(mostMm * Math.cos(radians(slope.pitchDeg)) + 1e-6)
    const edges = slope.edges.filter((index) => at(ground.plates.edges, index).overhangMm > most)
    return edges.flatMap((index) => overhang(index, most))
  })
  const each = answers
    .map(({ path, value }) => `${value} mm on edge ${Number(path.split('.')[1]) + 1}`)
    .join(', ')
  return cautionAbout(
    'overhang-long',
    long,
    (m) =>
      `The tail of ${m.mark} is ${wholeMm(m.tailLengthMm)} mm along the rafter, over 30 % of a span of ${wholeMm(spanMm)} mm (AS 1684.2, quoted second-hand).`,
    each === ''
      ? 'Shorten the overhang or have the tails designed.'
      : `Overhangs within it are at most ${each}; longer tails are for an engineer to design.`,
    answers,
  )
}

/** Slopes flatter than what the covering usually takes. */
export const lowPitch = (ground: Ground): Caution[] => {
  const { covering } = ground.settings
  if (covering === null) return []
  return ground.plates.slopes
    .filter((slope) => slope.pitchDeg < covering.minPitchDeg)
    .map((slope) =>
      cautionOf(
        'pitch-below-covering',
        [],
        `Edge ${at(slope.edges, 0) + 1} is pitched at ${halfDeg(slope.pitchDeg)}°; ${covering.name} usually takes ${halfDeg(covering.minPitchDeg)}° and up.`,
        "Steepen the slope, choose another covering, or ask the covering's maker.",
        slope.edges.map((edge) => ({
          path: `edges.${edge}.pitchDeg`,
          value: covering.minPitchDeg,
          unit: 'deg',
        })),
      ),
    )
}
