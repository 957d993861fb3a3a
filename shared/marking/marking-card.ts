import { pieceHand } from '../drawing/timber-hand.ts'
import { posedMember } from '../drawing/timber-pose.ts'
import type { CutLine, FrameSpec, Member, MemberRole } from '../roof/roof-types.ts'
import {
  bearsText,
  bevelsWords,
  cutsSawnAlike,
  edgeFigures,
  type MarkingEnd,
  markingEnds,
  tapeBase,
} from './marking-cuts.ts'
import {
  angleText,
  bevelWords,
  figureOf,
  type MarkingBevel,
  type MarkingFigure,
  type MarkingOptions,
} from './marking-figures.ts'
import {
  backingOf,
  birdsmouthOf,
  dishWords,
  dropOf,
  furtherFigures,
  planingWords,
} from './marking-parts.ts'
import { placeFigures } from './place-figures.ts'
import { handCounts, isBesideFrame, quantityWords, roleWords, sectionWords } from './role-words.ts'
import { wayWords } from './way-words.ts'

/** Wherever numbers leave for the saw. */
export const cutOneFirst = 'Cut one, try it, then cut the rest.'
/** Wherever work at height is planned. */
export const workAtHeight =
  'Scaffold or edge protection first, harness where those cannot be, as the safe work method statement and local law require. This list does not replace that statement.'

export type MarkingWarning = { text: string; remedy: string }

/** Everything a carpenter marks a line of the cut list from, in words and numbers. */
export type MarkingCard = {
  mark: string
  role: MemberRole
  name: string
  section: string
  quantity: number
  left: number
  right: number
  /** 'x4: 2 left, 2 right'. */
  quantityWords: string
  memberMarks: string[]
  /** The piece whose numbers these are; the drawing shows the same one. */
  drawnMark: string
  handWords: string
  /** What the saw needs, longest point to longest point. */
  cutLength: MarkingFigure
  setOutLength: MarkingFigure
  /** From end to end along its edges, where there is no heel line to measure from; and where it goes. */
  edges: MarkingFigure[]
  /** Deductions, rise, run: not needed to mark out, kept for who wants to check. */
  further: MarkingFigure[]
  pitchText: string
  ends: MarkingEnd[]
  birdsmouth: { figures: MarkingFigure[]; bevels: MarkingBevel[] } | null
  tailLength: MarkingFigure | null
  backing: MarkingBevel[]
  drop: MarkingFigure | null
  /** How the top is dished after it is cut, or null. */
  dish: string | null
  planing: string[]
  /** What its bevels are set to, for the dials beside it. */
  roundDeg: number
  warnings: MarkingWarning[]
}

/**
 * The card of one cut line. Lengths mm, angles degrees, exact; texts rounded as the options say.
 * `share` narrows what is said of single pieces to those of one task.
 * @throws RangeError when the spec has no such cut line.
 */
export function markingCardOf(
  spec: FrameSpec,
  cutLineMark: string,
  options: MarkingOptions,
  share?: readonly string[],
): MarkingCard {
  const line = spec.cutLines.find((one) => one.mark === cutLineMark)
  const alike = line ? membersOf(spec, line) : []
  const member = alike.find((one) => pieceHand(one)?.side === 'left') ?? alike[0]
  if (!line || !member) throw new RangeError(`This roof has no cut line ${cutLineMark}.`)
  const { left, right } = handCounts(alike)
  return {
    mark: line.mark,
    role: line.role,
    name: roleWords[line.role],
    section: sectionWords(line.section),
    quantity: line.quantity,
    left,
    right,
    quantityWords: quantityWords(line.quantity, left, right),
    memberMarks: line.members,
    drawnMark: member.mark,
    handWords: wayWords(spec, line, member, alike),
    cutLength: figureOf('Cut length', line.cutLengthMm, options, 'longest point to point'),
    setOutLength: figureOf('Set-out length', member.setOutLengthMm, options, setOutNote(member)),
    edges: [...edgeFigures(member, options), ...placeFigures(spec, member, options)],
    further: furtherFigures(member, options),
    pitchText: angleText(member.pitchDeg, options),
    ends: markingEnds(spec, member, alike, options),
    birdsmouth: birdsmouthOf(member, options),
    tailLength:
      member.tailLengthMm > 0 && member.role !== 'barge'
        ? figureOf('Tail length', member.tailLengthMm, options, 'heel line to tail, along the edge')
        : null,
    backing: backingOf(member, options),
    drop: dropOf(member, options),
    dish: dishWords(member, options),
    planing: planingWords(spec, { members: share ?? line.members }, options),
    roundDeg: options.roundDeg,
    warnings: spec.cautions
      .filter((caution) => caution.members.some((mark) => line.members.includes(mark)))
      .map(({ text, remedy }) => ({ text, remedy })),
  }
}

function membersOf(spec: FrameSpec, line: CutLine): Member[] {
  const marks = new Set(line.members)
  return spec.members
    .filter((member) => marks.has(member.mark))
    .map((member) => posedMember(spec, member))
}

function setOutNote(member: Member): string {
  if (member.role === 'ridge') return 'node to node'
  if (isBesideFrame(member)) return 'set-out point to set-out point'
  return member.birdsmouth
    ? `${tapeBase(member)} to centre, nothing off`
    : 'centre to centre, nothing off'
}

function figureWords(figure: MarkingFigure, note = false): string {
  const value = [figure.text, figure.unit].filter(Boolean).join(' ')
  return `${figure.label} ${value}${note && figure.note ? ` (${figure.note})` : ''}`
}

/** Cheeks sawn alike are one line; an only cut follows the place it is made at. */
function cutLines(end: MarkingEnd, place: string): string[] {
  return cutsSawnAlike(end)
    .map(({ name, cuts, first }) => {
      const bears = cuts.map(bearsText)
      const bearsTexts = bears.filter(Boolean).map((text) => ` ${text}.`)
      const title = place || [end.title, name.toLowerCase()].filter(Boolean).join(', ')
      return [`${title}: ${bevelsWords(first)}.${bearsTexts.join('')}`, ...first.sawWords]
    })
    .flat()
}

function endLines(end: MarkingEnd): string[] {
  const from = end.points[0]?.note ?? ''
  const only = end.points.length === 1 ? end.points[0] : undefined
  if (only) return cutLines(end, `${figureWords(only)} ${from}`.trim())
  const points = end.points.map((point) => figureWords(point).toLowerCase()).join('; ')
  const place = points ? [`${end.title}: ${points}; ${from}.`] : []
  return [...place, ...cutLines(end, '')]
}

function edgeLines({ edges }: MarkingCard): string[] {
  return edges.length > 0 ? [`${edges.map((one) => figureWords(one, true)).join('; ')}.`] : []
}

/** The tail's length where no tail point has said it. */
function tailLines({ tailLength, ends }: MarkingCard): string[] {
  if (!tailLength) return []
  const points = ends.filter((end) => end.end === 'tail').flatMap((end) => end.points)
  const isSaid = points.some((point) => point.text === tailLength.text)
  return isSaid ? [] : [`${figureWords(tailLength, true)}.`]
}

/** Short plain lines for mail and print; the first names the line. */
export function markingCardLines(card: MarkingCard): string[] {
  const mouth = card.birdsmouth
  return [
    `${card.mark}  ${card.name}  ${card.section}  ${card.quantityWords}`,
    `${figureWords(card.cutLength)}, ${figureWords(card.setOutLength).toLowerCase()}.`,
    ...edgeLines(card),
    ...card.ends.flatMap(endLines),
    ...(mouth
      ? [
          `Birdsmouth: ${mouth.figures.map((one) => figureWords(one).toLowerCase()).join(', ')}.`,
          `${mouth.bevels.map((one) => `${one.label} ${bevelWords(one)}`).join('; ')}.`,
        ]
      : []),
    ...tailLines(card),
    ...(card.dish ? [card.dish] : []),
    ...card.backing.map((one) => `${one.label}: ${bevelWords(one)}.`),
    ...(card.drop ? [`${figureWords(card.drop, true)}.`] : []),
    card.handWords,
    ...card.planing,
  ]
}
