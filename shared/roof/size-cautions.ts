import type { Ground } from './build-pieces.ts'
import { cautionAbout, isRafter, wholeMm } from './caution-words.ts'
import type { Caution, CautionAnswer, Member } from './roof-types.ts'
import { at, slopeGradient } from './slopes.ts'
import { birdsmouthShare } from './stand.ts'
import { dot2, radians } from './vector.ts'

/** A hip may have this much less over its seat than its rafters before anybody minds; a drop alone is less. */
const hipSlackMm = 5

const mm = (path: string, value: number): CautionAnswer[] =>
  Number.isFinite(value) && value > 0 ? [{ path, value, unit: 'mm' }] : []

/** Only a typed height over plate can bring this about: the one worked out leaves two thirds. */
const birdsmouthDeep = (members: Member[]): Caution[] => {
  const deep = members.filter(
    (m) =>
      isRafter(m) &&
      m.birdsmouth !== null &&
      m.birdsmouth.depthMm > m.section.depthMm * birdsmouthShare + 0.01,
  )
  const leastMm = Math.ceil(
    Math.max(
      ...deep.map(
        (m) => (m.section.depthMm * (1 - birdsmouthShare)) / Math.cos(radians(m.pitchDeg)) - 1e-6,
      ),
    ),
  )
  return cautionAbout(
    'birdsmouth-deep',
    deep,
    (m) =>
      `The birdsmouth takes ${wholeMm(m.birdsmouth?.depthMm ?? 0)} mm of a ${wholeMm(m.section.depthMm)} mm rafter, more than a third of its depth (AS 1684.2, quoted second-hand).`,
    `A height over plate of at least ${leastMm} mm leaves two thirds of every rafter.`,
    mm('standMm', leastMm),
  )
}

/** The kinds of timber that others bear on, their words and their sections. */
const kinds = [
  { name: 'ridge', roles: ['ridge'], section: 'ridge' },
  { name: 'hip', roles: ['hip', 'broken-hip'], section: 'hip' },
  { name: 'valley', roles: ['valley'], section: 'valley' },
] as const

const isOfKind = (member: Member, kind: (typeof kinds)[number]): boolean =>
  (kind.roles as readonly string[]).includes(member.role)

/** Timber over the seat, square to the edge: over a valley's heel, which stands further down, there is less. */
const overSeatMm = (m: Member, standMm: number): number => {
  const pitch = radians(m.pitchDeg)
  const { birdsmouth } = m
  if (birdsmouth === null) return m.section.depthMm
  const ownMm = Math.min(birdsmouth.standMm, standMm)
  return (ownMm - birdsmouth.heelOffsetMm * Math.tan(pitch)) * Math.cos(pitch)
}

/** Largest thickness at which a lowered hip's drop leaves it as much over its seat as it should have, mm. */
const mostThicknessMm = (ground: Ground, m: Member, standMm: number, leastMm: number): number => {
  const run = { x: m.axis.to.x - m.axis.from.x, y: m.axis.to.y - m.axis.from.y }
  const size = Math.hypot(run.x, run.y)
  const left = { x: -run.y / size, y: run.x / size }
  const falls = m.planes.map((p) =>
    Math.abs(dot2(slopeGradient(at(ground.plates.slopes, p)), left)),
  )
  const dropMm = standMm - (leastMm - hipSlackMm) / Math.cos(radians(m.pitchDeg))
  return Math.floor((2 * dropMm) / Math.max(...falls) + 1e-6)
}

/**
 * A deeper hip has no more over its seat (its birdsmouth grows with it), a thinner one drops less; so
 * the answer is a thickness.
 */
const thinOverSeat = (ground: Ground, standMm: number, members: Member[]): Caution[] => {
  const leastMm = (m: Member) =>
    Math.min(
      ...m.planes.map((p) => standMm * Math.cos(radians(at(ground.plates.slopes, p).pitchDeg))),
    )
  return kinds.flatMap((kind) => {
    if (kind.name === 'ridge') return []
    const thin = members.filter(
      (m) =>
        isOfKind(m, kind) &&
        m.birdsmouth !== null &&
        overSeatMm(m, standMm) < leastMm(m) - hipSlackMm,
    )
    const mostMm = Math.min(...thin.map((m) => mostThicknessMm(ground, m, standMm, leastMm(m))))
    const lowered = kind.name === 'hip' && thin.some((m) => m.dropMm > 0) && mostMm >= 15
    return cautionAbout(
      'hip-thin-over-seat',
      thin,
      (m) =>
        `Over its seat the ${kind.name} has ${wholeMm(overSeatMm(m, standMm))} mm of timber, its rafters have ${wholeMm(leastMm(m))} mm (common practice, no source).`,
      lowered
        ? `At most ${mostMm} mm thick it keeps as much as its rafters; backed instead of lowered it keeps it at any thickness.`
        : `Raise the height over plate, or have the seat of the ${kind.name} designed.`,
      lowered ? mm('sections.hip.thicknessMm', mostMm) : [],
    )
  })
}

/** Plumb cut of the rafters that bear on a ridge, hip or valley, against its own plumb depth. */
const sectionShallow = (ground: Ground, members: Member[]): Caution[] => {
  const depthMm = ground.roof.sections.rafter.depthMm
  const plumbCutMm = (m: Member) =>
    Math.max(
      ...m.planes.map((p) => depthMm / Math.cos(radians(at(ground.plates.slopes, p).pitchDeg))),
    )
  const ownMm = (m: Member) => m.section.depthMm / Math.cos(radians(m.pitchDeg))
  const neededMm = (m: Member) => plumbCutMm(m) * Math.cos(radians(m.pitchDeg))
  return kinds.flatMap((kind) => {
    const shallow = members.filter((m) => isOfKind(m, kind) && ownMm(m) < plumbCutMm(m) - 0.01)
    const leastMm = Math.ceil(Math.max(...shallow.map(neededMm)) - 0.01)
    return cautionAbout(
      'section-shallow',
      shallow,
      (m) =>
        `The ${kind.name} is ${wholeMm(ownMm(m))} mm deep plumb, the cut that bears on it ${wholeMm(plumbCutMm(m))} mm (IRC R802.3, quoted second-hand).`,
      `Full bearing needs the ${kind.name} at least ${leastMm} mm deep.`,
      mm(`sections.${kind.section}.depthMm`, leastMm),
    )
  })
}

/** Cautions about birdsmouths and about timber too shallow for what bears on it. */
export const sizeCautions = (ground: Ground, standMm: number, members: Member[]): Caution[] => [
  ...birdsmouthDeep(members),
  ...thinOverSeat(ground, standMm, members),
  ...sectionShallow(ground, members),
]
