import type { Role } from '../../../shared/auth/roles.ts'

export type DemoCrewLetter = 'A' | 'B' | 'C'

/** Everybody here is invented. Mobile numbers are from the ones the Australian regulator keeps for fiction. */
export type DemoPerson = {
  key: string
  name: string
  role: Role
  phone: string
  crew: DemoCrewLetter | null
}

export const demoPassword = 'quillback-demo'

export const demoFirm = {
  name: 'Quillback Roofing',
  phone: '(07) 5550 0140',
  timeZone: 'Australia/Brisbane',
  holidayCountry: 'AU',
  holidayState: 'QLD',
}

export const demoCrews = [
  { letter: 'A', name: 'Adze crew', colour: 1 },
  { letter: 'B', name: 'Bevel crew', colour: 2 },
  { letter: 'C', name: 'Cleat crew', colour: 3 },
] as const

export const demoPeople: DemoPerson[] = [
  { key: 'marnie', name: 'Marnie Quill', role: 'office', phone: '0491 570 006', crew: null },
  { key: 'desh', name: 'Desh Farrow', role: 'office', phone: '0491 570 110', crew: null },
  { key: 'tamsin', name: 'Tamsin Rook', role: 'leading-hand', phone: '0491 570 156', crew: 'A' },
  { key: 'wil', name: 'Wil Osei', role: 'apprentice', phone: '0491 570 157', crew: 'A' },
  { key: 'petra', name: 'Petra Vane', role: 'apprentice', phone: '0491 570 158', crew: 'A' },
  { key: 'corin', name: 'Corin Hale', role: 'leading-hand', phone: '0491 570 159', crew: 'B' },
  { key: 'jun', name: 'Jun Pell', role: 'apprentice', phone: '0491 570 313', crew: 'B' },
  { key: 'sef', name: 'Sef Lindmark', role: 'apprentice', phone: '0491 570 737', crew: 'B' },
  { key: 'nell', name: 'Nell Harrow', role: 'leading-hand', phone: '0491 571 266', crew: 'C' },
  { key: 'bram', name: 'Bram Tolley', role: 'apprentice', phone: '0491 571 491', crew: 'C' },
  { key: 'odette', name: 'Odette Finn', role: 'apprentice', phone: '0491 571 804', crew: 'C' },
]

export function demoEmail(person: DemoPerson): string {
  return `${person.key}@quillback.example`
}
