import { expect, test } from 'vitest'
import { type CrewMembership, movesGiving } from '../../shared/people/crew-moves.ts'

const from = '2026-12-07'
const row = (crewId: string, startsOn: string, endsOn: string | null): CrewMembership => ({
  crewId,
  startsOn,
  endsOn,
})

test('undoing a move puts a person back where they were, until further notice', () => {
  expect(movesGiving([row('adze', '2026-01-01', null)], from)).toEqual([{ crewId: 'adze', from }])
})

test('a move planned for later is put back too, and so is leaving', () => {
  const was = [row('bevel', '2026-12-14', '2026-12-18'), row('adze', '2026-01-01', '2026-12-13')]
  expect(movesGiving(was, from)).toEqual([
    { crewId: 'adze', from },
    { crewId: 'bevel', from: '2026-12-14' },
    { crewId: null, from: '2026-12-19' },
  ])
})

test('whoever was in no crew goes back to none, until the move that was planned', () => {
  expect(movesGiving([row('adze', '2025-01-01', '2025-06-30')], from)).toEqual([
    { crewId: null, from },
  ])
  expect(movesGiving([row('bevel', '2026-12-14', null)], from)).toEqual([
    { crewId: null, from },
    { crewId: 'bevel', from: '2026-12-14' },
  ])
})
