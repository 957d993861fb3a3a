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
  return markingCardOf(roof.spec, line.mark ?? '', roof.options)
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
  if (toStand.length === 0) return []
  const cutToday = new Set(toCut.map((line) => line.mark))
  const above = toStand.filter((line) => cutToday.has(line.mark))
  const others = toStand.filter((line) => !cutToday.has(line.mark))
  const list: MailBlock[] = [
    { kind: 'paragraph', text: 'Cut the same day, numbers above:' },
    { kind: 'list', items: above.map((line) => lineTitle(line, cardFor(line, roof), roof)) },
  ]
  return [
    { kind: 'subheading', text: 'To stand' },
    ...(above.length > 0 ? list : []),
    ...others.map((line) => lineCard(line, roof)),
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
  const other = booking.lines.filter((line) => line.mark === null)
  const blocks: MailBlock[] = []
  if (other.length > 0) {
    blocks.push(
      { kind: 'subheading', text: 'Set out, try and brace' },
      { kind: 'list', items: other.map((line) => line.title) },
    )
  }
  if (!roof) {
    blocks.push({
      kind: 'caution',
      text: 'No roof is issued for this job yet, so there are no lengths. Ask the office.',
    })
    return blocks
  }
  const toCut = markedLines(booking, roof, 'cut')
  const toStand = markedLines(booking, roof, 'stand')
  blocks.push(...platesBlocks(roof))
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

/** The whole day: each booking with its facts and numbers, the safety words, the link. */
export function dayBlocks(mail: DayMail): MailBlock[] {
  if (mail.bookings.length === 0) return []
  return [
    ...mail.bookings.flatMap(bookingBlocks),
    { kind: 'caution', text: workAtHeight },
    { kind: 'link', label: `Open ${mail.dayWords}`, url: mail.url },
  ]
}

export function closingBlock(mail: DayMail): MailBlock {
  const call = mail.firmPhone === '' ? '' : ` Questions: call the office on ${mail.firmPhone}.`
  return { kind: 'paragraph', text: `${mail.firmName}.${call}` }
}
