import type { Caution, CautionAnswer, CautionCode, Member } from './roof-types.ts'

const ending =
  'Sizes and tie-down are for span tables, local codes and a licensed engineer or builder; this program sets out timber, it does not size it.'

export const wholeMm = (mm: number): string => String(Math.round(mm))
export const halfDeg = (deg: number): string => (Math.round(deg * 2) / 2).toFixed(1)

/** A length to a tenth of a millimetre, in words without a trailing nought. */
export const tenthMm = (mm: number): number => Math.round(mm * 10) / 10

/** One caution; its remedy ends with whose business sizes are. */
export const cautionOf = (
  code: CautionCode,
  members: Pick<Member, 'mark'>[],
  text: string,
  remedy: string,
  answers: CautionAnswer[] = [],
): Caution => ({
  code,
  members: members.map((m) => m.mark),
  text,
  remedy: `${remedy} ${ending}`,
  ...(answers.length > 0 ? { answers } : {}),
})

/** One caution for all members that it concerns; none when there are none. */
export const cautionAbout = (
  code: CautionCode,
  members: Member[],
  text: (first: Member) => string,
  remedy: string,
  answers: CautionAnswer[] = [],
): Caution[] => {
  const [first] = members
  return first === undefined ? [] : [cautionOf(code, members, text(first), remedy, answers)]
}

const rafterRoles = ['common', 'crown-end', 'creeper', 'valley-creeper', 'cripple-creeper']
const besideRoles = ['underpurlin', 'collar-tie', 'fascia', 'barge']

export const isRafter = (member: Pick<Member, 'role'>): boolean => rafterRoles.includes(member.role)
export const standsBeside = (member: Pick<Member, 'role'>): boolean =>
  besideRoles.includes(member.role)
