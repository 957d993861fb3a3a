import type { NotToldPerson, TellThem } from '../../../shared/notices/notice-schemas.ts'

const daysToTell = (person: NotToldPerson): string[] =>
  person.days.filter((day) => !day.isOnItsWay).map((day) => day.day)

/** Who can be mailed and has a day no mail is on its way for. */
export function stillToTell(people: readonly NotToldPerson[]): NotToldPerson[] {
  return people.filter((person) => !person.hasNoEmail && daysToTell(person).length > 0)
}

export function asTellThem(people: readonly NotToldPerson[]): TellThem {
  return { people: stillToTell(people).map((one) => ({ id: one.id, days: daysToTell(one) })) }
}

export const mailWords = (count: number): string => (count === 1 ? '1 mail' : `${count} mails`)
