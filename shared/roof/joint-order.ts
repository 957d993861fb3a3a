import { boxGrid } from './box-grid.ts'
import { brokenFootCut, sidesAt } from './broken-foot.ts'
import type { Ground } from './build-pieces.ts'
import { bodyOf, jointFaults } from './joint-faults.ts'
import { endJobs, phases, usualWay } from './joint-phases.ts'
import type { EndJob, JointWay, JointWays } from './joint-phases.ts'
import { jointMitres } from './joint-mitres.ts'
import { jointGroups, waysToTry } from './joint-ways.ts'
import { isAlongCrease } from './piece.ts'
import type { Piece, PieceEnd, PlanCut } from './piece.ts'
import { ridgeDirections, ridgeEnd, runsInto } from './ridge-ends.ts'
import { at } from './slopes.ts'
import { bodyObstacle, halfObstacle, trimEnd } from './trim.ts'
import type { Near, Obstacle } from './trim.ts'
import { distance2 } from './vector.ts'

/** Trims an end; it may run past its set-out end as far as its joint's centre and a little more. */
const trimmed = (ground: Ground, job: EndJob, near: Near, cuts: PlanCut[]) => {
  const { piece, end, joint } = job
  const set = end === 'head' ? piece.head : piece.foot
  const toCentre = joint === null ? 0 : distance2(set, at(ground.joints.joints, joint).point)
  return trimEnd(piece, end, near, cuts, toCentre + 3 * piece.halfMm)
}

const endCuts = ({ piece, end }: EndJob): PlanCut[] =>
  end === 'head' ? piece.headCuts : piece.footCuts

const isShared = (cut: PlanCut, job: EndJob, jobs: EndJob[]): boolean =>
  jobs.some(
    (mate) =>
      mate.piece.id === cut.mitreWith &&
      mate.joint === job.joint &&
      endCuts(mate).some((c) => c.mitreWith === job.piece.id),
  )

/** The foot of a broken hip, by the way of its joint. */
const brokenFoot = (job: EndJob, jobs: EndJob[], ways: JointWays): PlanCut => {
  const isCrown = (j: EndJob) => j.phase === phases.firstCrown && j.joint === job.joint
  const heads = jobs.filter((j) => j.joint === job.joint && j.end === 'head')
  const way = (job.joint === null ? null : ways.get(job.joint)) ?? usualWay
  const sides = sidesAt(
    job.piece,
    heads.map((j) => j.piece),
  )
  return brokenFootCut(job.piece, heads.find(isCrown)?.piece ?? null, sides, way.foot)
}

/** What stands already, and takes what is placed. */
type Standing = { near: Near; put: (obstacle: Obstacle, slot: string) => void }

const setCuts = (job: EndJob, cuts: PlanCut[], standing: Standing) => {
  if (job.end === 'head') job.piece.headCuts = cuts
  else job.piece.footCuts = cuts
  standing.put(halfObstacle(job.piece, job.end), `${job.piece.id}${job.end}`)
}

const clearEnd = ({ piece, end }: EndJob) => {
  if (end === 'head') piece.headCuts = []
  else piece.footCuts = []
}

const hasFootJob = (piece: Piece): boolean =>
  piece.role === 'ridge' || piece.footJoint !== null || piece.footLine !== null

/** Places ends in their order, after those of `before`; changes their pieces' cut lists. */
const placeJobs = (
  ground: Ground,
  jobs: EndJob[],
  ways: JointWays,
  standing: Standing,
  before: readonly EndJob[],
): void => {
  const placed: EndJob[] = [...before]
  jobs.forEach((job, k) => {
    const { phase } = job
    if (phase === phases.brokenFoot) setCuts(job, [brokenFoot(job, jobs, ways)], standing)
    else {
      const isButt = job.joint === null || phase === phases.ridgeButt
      const mitres = isButt ? [] : jointMitres(ground, job, jobs, placed)
      setCuts(job, trimmed(ground, job, standing.near, mitres), standing)
    }
    placed.push(job)
    if (!hasFootJob(job.piece)) {
      standing.put(halfObstacle(job.piece, 'foot'), `${job.piece.id}foot`)
    }
    if (job.joint === null || jobs[k + 1]?.phase === phase) return
    // a mitre whose mate found something else to bear on is no mitre
    for (const done of placed.filter((j) => j.phase === phase)) {
      const cuts = endCuts(done)
      const kept = cuts.filter((cut) => cut.mitreWith !== null && isShared(cut, done, jobs))
      if (cuts.every((cut) => cut.mitreWith === null || kept.includes(cut))) continue
      setCuts(done, trimmed(ground, done, standing.near, kept), standing)
    }
  })
}

/**
 * Ends of ridges that butt nothing. One that would run into the side of a ridge that passes its joint
 * butts it after all; of two ends that would run into each other, that of the shorter ridge.
 */
const placeRidges = (ground: Ground, jobs: EndJob[], creases: Near, standing: Standing): void => {
  const { chains } = ground.joints
  const rank = ({ piece }: EndJob) => chains.findIndex((c) => c.lines[0] === piece.line)
  const free = jobs.filter(({ phase }) => phase === phases.ridge)
  free.sort((a, b) => rank(a) - rank(b))
  const cuts = new Map(free.map((job) => [job, ridgeEnd(ground, job, jobs, creases)]))
  const hits = (job: EndJob, other: EndJob) => {
    const cut = cuts.get(job)
    const { headJoint, footJoint } = other.piece
    const isOwn = job.joint !== null && (headJoint === job.joint || footJoint === job.joint)
    return !isOwn && cut !== undefined && runsInto(job, cut, other.piece)
  }
  for (const job of free) {
    const isStopped = free.some(
      (other) =>
        hits(job, other) &&
        !free.some((end) => end.piece === other.piece && hits(end, job) && rank(end) > rank(job)),
    )
    const cut = cuts.get(job)
    if (isStopped) job.phase = phases.ridgeButt
    else if (cut !== undefined) setCuts(job, [cut], standing)
  }
}

/** A few obstacles, all near, over what stood before. */
const overlay = (before: readonly Obstacle[]): Standing => {
  const own = new Map<string, Obstacle>()
  return {
    near: () => [...before, ...own.values()],
    put: (obstacle, slot) => own.set(slot, obstacle),
  }
}

/** Ends placed on trial for one roof; a house with odd corners needs some hundreds, a second's work is this many. */
const mostTrials = 5_000

/** What is left of the trials, so that a plan of many small corners does not go on for minutes. */
type Trials = { left: number }

/** Places one group of joints near each other, the usual way or, where that leaves a head open, the first way that does not. */
const placeGroup = (
  ground: Ground,
  pieces: Piece[],
  group: number[],
  before: readonly Obstacle[],
  trials: Trials,
): { jobs: EndJob[]; openPieces: readonly number[] } => {
  const isOwn = (joint: number | null) => joint !== null && group.includes(joint)
  const own = pieces.filter(
    (p) => isOwn(p.headJoint) || isOwn(p.footJoint) || p.through.some(isOwn),
  )
  const ridges = ridgeDirections(pieces, group)
  const bodies = before.map(bodyOf)
  const place = (ways: JointWays) => {
    const jobs = endJobs(ground, own, ways).filter(
      (job) => isOwn(job.joint) && job.phase > phases.ridgeButt,
    )
    // or a timber with both ends here would stand in the way as the trial before cut it
    jobs.forEach(clearEnd)
    placeJobs(ground, jobs, ways, overlay(before), ridges)
    return { jobs, faults: jointFaults(jobs, bodies, hasFootJob) }
  }
  let ways: JointWays = new Map<number, JointWay>()
  let best = place(ways)
  let standing = best
  const tryWays = (joint: number, isDone: () => boolean) => {
    for (const way of waysToTry(own, joint)) {
      if (isDone()) return
      trials.left -= best.jobs.length
      if (trials.left < 0) return
      const tried = new Map(ways).set(joint, way)
      standing = place(tried)
      if (standing.faults.total >= best.faults.total) continue
      best = standing
      ways = tried
    }
  }
  for (const joint of group) tryWays(joint, () => !best.faults.needsOther(joint))
  // what leaves a head open, or cuts a valley short, can be the joint beside it
  const isClosed = () => best.faults.openPieces.length === 0 && !best.faults.stopsShort
  for (let round = 0; round < 2 && group.length > 1; round++) {
    for (const joint of group) tryWays(joint, isClosed)
  }
  const { jobs, faults } = standing === best ? best : place(ways)
  return { jobs, openPieces: faults.openPieces }
}

/** When an end was placed; with null, the first end of that piece. */
type PlacedAt = (piece: number, end: PieceEnd | null) => number

const placedAt = (pieces: Piece[], placed: EndJob[]): PlacedAt => {
  const headAt = pieces.map(() => -1)
  const footAt = pieces.map(() => -1)
  placed.forEach(({ piece, end }, k) => ((end === 'head' ? headAt : footAt)[piece.id] = k))
  return (piece, end) => {
    const [head = -1, foot = -1] = [headAt[piece], footAt[piece]]
    if (end !== null) return end === 'head' ? head : foot
    return foot < 0 ? head : Math.min(head, foot)
  }
}

type JointsCut = {
  placedAt: PlacedAt
  /** Whether an end was there first, cut to bear on nothing. */
  standsFree: (piece: number, end: PieceEnd) => boolean
  openPieces: ReadonlySet<number>
}

const isFree = ({ phase }: EndJob): boolean => phase === phases.ridge || phase === phases.brokenFoot

/**
 * Cuts all ends that meet other timber, in the order of who runs through and who butts: ridges and
 * their commons, then joint by joint, then creepers; changes the pieces' cut lists. Tails and
 * birdsmouths are not touched. Says when each end was placed, and whose heads no way closed.
 */
export const cutJoints = (ground: Ground, pieces: Piece[]): JointsCut => {
  const all = endJobs(ground, pieces, new Map())
  const isEarly = (job: EndJob) =>
    job.phase <= phases.ridgeButt || (job.joint === null && job.phase === phases.common)
  const early = all.filter(isEarly)
  const grid = boxGrid<Obstacle>()
  const put = (obstacle: Obstacle) => grid.put(obstacle, obstacle.box)
  const bodies = boxGrid<Obstacle>()
  for (const piece of pieces) {
    const body = isAlongCrease(piece.role) ? bodyObstacle(piece) : null
    if (body === null) continue
    put(body)
    bodies.put(body, body.box)
  }
  placeRidges(ground, all, bodies.near, { near: grid.near, put })
  const rest = early.filter(({ phase }) => phase !== phases.ridge)
  placeJobs(ground, rest, new Map(), { near: grid.near, put }, [])
  const placed = [...early]
  const trials: Trials = { left: mostTrials }
  const openPieces = new Set<number>()
  for (const group of jointGroups(ground)) {
    const isOther = ({ runsTo }: Obstacle) =>
      runsTo === undefined ||
      !runsTo.some((joint) => joint !== null && group.joints.includes(joint))
    const before = grid.near(group.box).filter(isOther)
    const made = placeGroup(ground, pieces, group.joints, before, trials)
    placed.push(...made.jobs)
    made.openPieces.forEach((piece) => openPieces.add(piece))
    for (const job of made.jobs) {
      put(halfObstacle(job.piece, job.end))
      if (!hasFootJob(job.piece)) put(halfObstacle(job.piece, 'foot'))
    }
  }
  const late = all.filter((job) => job.joint === null && !isEarly(job))
  placeJobs(ground, late, new Map(), { near: grid.near, put }, [])
  placed.push(...late)
  const free = new Set(placed.filter(isFree).map(({ piece, end }) => `${piece.id}${end}`))
  return {
    placedAt: placedAt(pieces, placed),
    standsFree: (piece, end) => free.has(`${piece}${end}`),
    openPieces,
  }
}
