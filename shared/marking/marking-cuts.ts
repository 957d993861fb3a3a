import { groupBy } from '../collections/group-by.ts'
import { cutWords, faceAngle } from '../drawing/bevel-dials.ts'
import { type MeasuringPoint, measuringPoints } from '../drawing/timber-points.ts'
import { heelOutAlongMm } from '../drawing/timber-outline.ts'
import { edgeLengths, endCuts, timberEndMm, timberTop } from '../drawing/timber-shape.ts'
import type { Cut, FrameSpec, Member } from '../roof/roof-types.ts'
import {
  angleText,
  bevelOf,
  bevelWords,
  figureOf,
  type MarkingBevel,
  type MarkingFigure,
  type MarkingOptions,
} from './marking-figures.ts'
import { cornerLine } from './marking-parts.ts'
import { isBesideFrame, piecesWords } from './role-words.ts'
import { pastSawWords } from './saw-words.ts'

export type MarkingCut = {
  /** 'Left cheek', 'Right cheek', or empty for the only cut of its end. */
  cheek: string
  /** 'plumb cut', 'square cut', 'cut'. */
  kind: string
  longSide: Cut['longSide']
  /** 'Bears on the ridge R1', or empty for a tail. */
  bearsOn: string
  /** Down the side face: the plumb bevel of a plumb cut. */
  face: MarkingBevel
  /** Across the top; null when the cut runs square across. */
  edge: MarkingBevel | null
  /** Across the other kind of top (square where this one is backed). */
  edgeOtherTop: MarkingBevel | null
  bladeTiltDeg: number
  bladeTiltText: string
  pastSaw: boolean
  /** What is needed past the saw, the way round and its safety words; empty otherwise. */
  sawWords: string[]
}

/** One end of a timber: where the tape reads it, and its saw cuts. */
export type MarkingEnd = {
  end: Cut['end']
  title: string
  /** Long and short points, from the heel plumb line. */
  points: MarkingFigure[]
  cuts: MarkingCut[]
}

const squareDeg = 0.05
const samePointMm = 0.05
const endTitles: Record<Cut['end'], string> = { head: 'Head', foot: 'Foot', tail: 'Tail' }

/** Head, then tail or foot: the head is measured to from the heel line first. */
export function markingEnds(
  spec: FrameSpec,
  member: Member,
  alike: readonly Member[],
  options: MarkingOptions,
): MarkingEnd[] {
  return (['head', 'foot'] as const).flatMap((end) => {
    const cuts = leftCheekFirst(endCuts(member, end))
    const first = cuts[0]
    if (!first) return []
    return [
      {
        end: first.end,
        title: endTitles[first.end],
        points: endPoints(member, end, cuts, options),
        cuts: cuts.map((cut) => markingCut(spec, member, alike, cut, cuts.length, options)),
      },
    ]
  })
}

/** A cheek lies on the side of its short point. */
function leftCheekFirst(cuts: readonly Cut[]): Cut[] {
  const rank = { right: 0, none: 1, left: 2 }
  return [...cuts].sort((a, b) => rank[a.longSide] - rank[b.longSide])
}

function markingCut(
  spec: FrameSpec,
  member: Member,
  alike: readonly Member[],
  cut: Cut,
  cutCount: number,
  options: MarkingOptions,
): MarkingCut {
  const across = Math.abs(cut.edge.fromSquareDeg) > squareDeg
  const kind = cutWords(member, cut)
  const { topName, otherName } = topNames(member)
  return {
    cheek: cutCount > 1 ? cheekName(cut) : '',
    kind,
    longSide: cut.longSide,
    bearsOn: bearsOnWords(spec, alike, member, cut, cutCount),
    face: bevelOf(faceName(kind), 'side', faceAngle(member, cut), options),
    edge: across ? bevelOf(topName, 'top', cut.edge, options) : null,
    edgeOtherTop:
      across && cut.edgeOtherTop ? bevelOf(otherName, 'top', cut.edgeOtherTop, options) : null,
    bladeTiltDeg: cut.bladeTiltDeg,
    bladeTiltText: angleText(cut.bladeTiltDeg, options),
    pastSaw: cut.pastSaw,
    sawWords: pastSawWords(member, cut, options),
  }
}

/** Edge bevels are marked on the top as it is when the timber is sawn. */
function topNames(member: Member): { topName: string; otherName: string } {
  switch (timberTop(member)) {
    case 'backed':
      return { topName: 'Across the backed top', otherName: 'Across a square top' }
    case 'dished':
      return {
        topName: 'Across the square top, before dishing',
        otherName: 'Across the dished top',
      }
    case 'square': {
      const other = member.role === 'valley' ? 'dished' : 'backed'
      return { topName: 'Across the top', otherName: `Across a ${other} top` }
    }
  }
}

function faceName(kind: string): string {
  if (kind === 'splay cut') return 'Down the side, longer below'
  return kind === 'plumb cut' ? 'Plumb bevel, down the side' : 'Down the side'
}

function cheekName(cut: Cut): string {
  if (cut.longSide === 'none') return 'Square across'
  return cut.longSide === 'left' ? 'Right cheek' : 'Left cheek'
}

/** What a cut lies against; one card stands for alike pieces that may meet different ones. */
function bearsOnWords(
  spec: FrameSpec,
  alike: readonly Member[],
  member: Member,
  cut: Cut,
  cutCount: number,
): string {
  // Left and right cheeks change places from piece to piece, so the drawn one's are named.
  const onlyDrawn = cutCount > 1
  const cuts = onlyDrawn ? [cut] : alike.flatMap((m) => m.cuts.filter((c) => c.end === cut.end))
  const marks = new Set(cuts.flatMap((c) => [c.against, ...c.alsoAgainst]))
  const met = spec.members.filter((m) => marks.has(m.mark))
  if (met.length === 0) return ''
  const whose = onlyDrawn && alike.length > 1 ? `${member.mark} ` : ''
  // A head bears on what it meets; a foot or tail is cut against the side of what runs past it.
  const verb = cut.end === 'head' && !isBesideFrame(member) ? 'bears on' : 'against'
  return capital(`${whose}${verb} ${piecesWords(met)}`)
}

function isMeasuredByEdges({ birdsmouth, role }: Member): boolean {
  return birdsmouth === null && role !== 'ridge'
}

/** 'Left cheek: bears on the hip H1', 'Against the valley V1'; empty for a cut that meets nothing. */
export function bearsText({ cheek, bearsOn }: MarkingCut): string {
  if (!bearsOn || !cheek) return bearsOn
  return `${cheek}: ${bearsOn.replace(/^(Bears|Against)/, (word) => word.toLowerCase())}`
}

function endPoints(
  member: Member,
  end: 'head' | 'foot',
  cuts: readonly Cut[],
  options: MarkingOptions,
): MarkingFigure[] {
  if (isMeasuredByEdges(member)) return []
  const only = cuts.length === 1 ? cuts[0] : undefined
  const points = only
    ? singleCutPoints(only)
    : measuringPoints(member, end).map((point) => ({
        label: pointLabel(point),
        alongMm: point.alongMm,
      }))
  return points.map(({ label, alongMm }) =>
    figureOf(label, Math.abs(alongMm), options, fromWords(member, cuts, alongMm)),
  )
}

/** With no heel line to hook the tape on, a timber is measured from its own foot; else nothing. */
export function edgeFigures(member: Member, options: MarkingOptions): MarkingFigure[] {
  if (!isMeasuredByEdges(member)) return []
  const edges = edgeLengths(member).map(({ place, fromMm, toMm }) =>
    figureOf(
      capital(place),
      toMm - fromMm,
      options,
      place === 'along the top' ? 'foot to head' : 'along the top, foot to head',
    ),
  )
  if (member.role !== 'collar-tie') return edges
  const under = (end: 'head' | 'foot') => timberEndMm(member, end, 0, member.section.depthMm)
  const underMm = under('head') - under('foot')
  return [...edges, figureOf('Along the underside', underMm, options, 'foot to head')]
}

function pointLabel({ name, end, side }: MeasuringPoint): string {
  if (name === 'cut') return cutLabel(end)
  return name === 'edge' ? `${capital(side)} edge` : `${capital(name)}, ${side}`
}

function cutLabel(end: Cut['end']): string {
  return `${endTitles[end]} cut`
}

function singleCutPoints(cut: Cut): { label: string; alongMm: number }[] {
  const { longPointFromHeelMm: long, shortPointFromHeelMm: short, longSide } = cut
  if (longSide === 'none' || Math.abs(long - short) <= samePointMm)
    return [{ label: cutLabel(cut.end), alongMm: long }]
  const shortSide = longSide === 'left' ? 'right' : 'left'
  return [
    { label: `Long point, ${longSide}`, alongMm: long },
    { label: `Short point, ${shortSide}`, alongMm: short },
  ]
}

/** What the tape is hooked on, and which way it runs. */
function fromWords(member: Member, cuts: readonly Cut[], alongMm: number): string {
  const base = tapeBase(member)
  const end = cuts[0]?.end
  if (end === 'head') return `from ${base}`
  if (end === 'tail') return alongMm > 0 ? `up from ${base}` : `down from ${base}`
  return alongMm < 0 ? `past ${base}` : `in from ${base}`
}

export function tapeBase(member: Member): string {
  if (member.role === 'ridge') return 'the first node'
  return heelOutAlongMm(member) > 0 ? cornerLine : 'the heel line'
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1)
}

/** A cut's bevels in one run of words. */
export function bevelsWords(cut: MarkingCut): string {
  if (cut.kind === 'square cut' && !cut.edge) return 'square cut'
  if (cut.kind === 'mitre')
    return `mitre, square down the side${cut.edge ? `; across the top ${bevelWords(cut.edge)}; blade tilt ${cut.bladeTiltText}` : ''}`
  const across = cut.edge
    ? `; across the top ${bevelWords(cut.edge)}; blade tilt ${cut.bladeTiltText}`
    : '; square across the top'
  const below = cut.kind === 'splay cut' ? ', longer below' : ''
  return `${cut.kind}, down the side ${bevelWords(cut.face)}${below}${across}`
}

export type CutsSawnAlike = { name: string; first: MarkingCut; cuts: MarkingCut[] }

/** The cuts of an end, those with the same settings of bevel and blade together. */
export function cutsSawnAlike(end: MarkingEnd): CutsSawnAlike[] {
  const groups = groupBy(end.cuts, (cut) => [bevelsWords(cut), ...cut.sawWords].join('|'))
  return [...groups.values()].flatMap((cuts) => {
    const first = cuts[0]
    if (!first) return []
    return [{ name: cuts.length > 1 ? 'Both cheeks' : first.cheek, first, cuts }]
  })
}
