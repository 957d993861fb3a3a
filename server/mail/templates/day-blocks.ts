import {
  cutOneFirst,
  type MarkingCard,
  markingCardLines,
  markingCardOf,
  workAtHeight,
} from '../../../shared/marking/marking-card.ts'
import { shareWords } from '../../../shared/marking/role-words.ts'
import type { DayMail, DayMailBooking } from '../day-mail.ts'
import type { ToldLine } from '../told-day.ts'
import type { MailBlock } from './mail-document.ts'

type Roof = NonNullable<DayMailBooking['roof']>

export const platesNotMeasured = 'From plan, plates not measured'

const orderOfWork = { cut: 'Cut', stand: 'Stand', 'set-out': 'Set out' } as const

/** What of the line is due today: all of it, or these pieces. */
function dueWords(line: ToldLine, card: MarkingCard, roof: Roof): string {
  if (line.quantity === card.quantity) return card.quantityWords
  const share = shareWords(roof.spec.members, line.members)
  return `${share} (${line.members.join(', ')}; ${card.quantity} in all)`
}

/** A task may name a line that the roof has lost; the rest of the mail still goes. */
function isInRoof(line: ToldLine, roof: Roof): boolean {
  return roof.spec.cutLines.some((one) => one.mark === line.mark)
}

function lineTitle(line: ToldLine, card: MarkingCard, roof: Roof): string {
  return `${orderOfWork[line.work]} ${card.mark} ${card.name} ${card.section}, ${dueWords(line, card, roof)}`
}

function cardFor(line: ToldLine, roof: Roof): MarkingCard {
  return markingCardOf(roof.spec, line.mark ?? '', roof.options, line.members)
}

function lineCard(line: ToldLine, roof: Roof): MailBlock {
  const card = cardFor(line, roof)
  return {
    kind: 'card',
    title: lineTitle(line, card, roof),
    // The first names the line, as the title does.
    lines: markingCardLines(card).slice(1),
  }
}

/** What was cut the same day has its numbers above; what was cut before gets them again. */
function standBlocks(toStand: ToldLine[], toCut: ToldLine[], roof: Roof): MailBlock[] {
  const cutToday = new Set(toCut.map((line) => line.mark))
  const cutBefore = toStand.filter((line) => !cutToday.has(line.mark))
  if (cutBefore.length === 0) return []
  return [
    { kind: 'subheading', text: 'To stand, cut before' },
    ...cutBefore.map((line) => lineCard(line, roof)),
  ]
}

/** 'Cut creeper CR1, x8: 4 left, 4 right'; set-out work has its own words. */
function orderWords(line: ToldLine, roof: DayMailBooking['roof']): string {
  if (line.mark === null) return line.title
  const work = orderOfWork[line.work]
  if (!roof || !isInRoof(line, roof)) return `${work} ${line.mark}`
  const name = cardFor(line, roof).name.toLowerCase()
  return `${work} ${name} ${line.mark}, ${shareWords(roof.spec.members, line.members)}`
}

/** The whole day in the order it is worked, a line each; the numbers follow. */
function orderBlocks({ lines, roof }: DayMailBooking): MailBlock[] {
  if (lines.length === 0) return []
  const item = (line: ToldLine, i: number) => `${i + 1}. ${orderWords(line, roof)}`
  return [
    { kind: 'subheading', text: 'Order of work' },
    { kind: 'paragraph', text: lines.map(item).join('\n') },
  ]
}

function markedLines(booking: DayMailBooking, roof: Roof, work: 'cut' | 'stand'): ToldLine[] {
  return booking.lines.filter((line) => line.work === work && isInRoof(line, roof))
}

function platesBlocks({ plates }: Roof): MailBlock[] {
  if (plates === null)
    return [{ kind: 'caution', text: `${platesNotMeasured}. Check sides and diagonals first.` }]
  if (plates.differing === 0) return []
  const lengths = plates.differing === 1 ? '1 length is' : `${plates.differing} lengths are`
  return [
    {
      kind: 'caution',
      text: `The plates were measured and ${lengths} off plan. Look at the check before you cut.`,
    },
  ]
}

/** Each said once, for several lines may share it. */
function cautionBlocks({ cautions }: DayMailBooking): MailBlock[] {
  if (cautions.length === 0) return []
  return [
    { kind: 'subheading', text: 'Take care' },
    { kind: 'list', items: cautions },
  ]
}

function workBlocks(booking: DayMailBooking): MailBlock[] {
  const { roof } = booking
  const blocks: MailBlock[] = []
  if (!roof) {
    blocks.push(...orderBlocks(booking), {
      kind: 'caution',
      text: 'No roof is issued for this job yet, so there are no lengths. Ask the office.',
    })
    return blocks
  }
  const toCut = markedLines(booking, roof, 'cut')
  const toStand = markedLines(booking, roof, 'stand')
  blocks.push(...platesBlocks(roof), ...orderBlocks(booking))
  if (toCut.length > 0) {
    blocks.push(
      { kind: 'subheading', text: 'To cut' },
      { kind: 'paragraph', text: cutOneFirst },
      ...toCut.map((line) => lineCard(line, roof)),
    )
  }
  blocks.push(...standBlocks(toStand, toCut, roof), ...cautionBlocks(booking))
  const lost = booking.lines.filter((line) => line.mark !== null && !isInRoof(line, roof))
  if (lost.length > 0)
    blocks.push({
      kind: 'caution',
      text: `Planned, but not in this revision of the roof: ${lost.map((line) => line.mark).join(', ')}. Ask the office.`,
    })
  if (toCut.length + toStand.length === 0)
    blocks.push({ kind: 'paragraph', text: 'No lines of the cut list are planned for this day.' })
  return blocks
}

function factsOf(booking: DayMailBooking): [string, string][] {
  const { told } = booking
  const facts: [string, string][] = [
    ['Start', told.startAt],
    ['Site', told.site],
    ['Getting in', told.access],
    ['On site ask for', booking.siteContact],
    ['Who', booking.who.join(', ')],
    ['Bring', told.gear],
    ['Roof', told.revision === null ? '' : `Revision ${told.revision}`],
    ['Notes', booking.crewNotes],
  ]
  return facts.filter(([, value]) => value.trim() !== '')
}

function bookingBlocks(booking: DayMailBooking): MailBlock[] {
  return [
    { kind: 'heading', text: `${booking.told.jobNumber} ${booking.told.jobTitle}` },
    { kind: 'facts', facts: factsOf(booking) },
    ...workBlocks(booking),
  ]
}

/** The whole day: the link, each booking with its facts, order and numbers, the safety words. */
export function dayBlocks(mail: DayMail): MailBlock[] {
  if (mail.bookings.length === 0) return []
  return [
    { kind: 'link', label: `Open ${mail.dayWords}`, url: mail.url },
    ...mail.bookings.flatMap(bookingBlocks),
    { kind: 'caution', text: workAtHeight },
  ]
}

export function closingBlock(mail: DayMail): MailBlock {
  const call = mail.firmPhone === '' ? '' : ` Questions: call the office on ${mail.firmPhone}.`
  return { kind: 'paragraph', text: `${mail.firmName}.${call}` }
}
