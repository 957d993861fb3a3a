import { expect, test } from 'vitest'
import { cornersOfPaste } from '../../shared/outline/pasted-corners.ts'
import { lCorners } from './l-outline.ts'

const written = (part: string, number = (mm: number) => `${mm}`) =>
  lCorners.map(({ x, y }) => `${number(x)}${part}${number(y)}`).join('\n')

test.each([
  ['a comma', ', '],
  ['a bare comma', ','],
  ['a semicolon', '; '],
  ['a tab', '\t'],
  ['spaces', '   '],
])('corners parted by %s are read in millimetres', (_, part) => {
  expect(cornersOfPaste(written(part))).toMatchObject({
    corners: lCorners,
    unit: 'mm',
    isUnitGuessed: true,
    wasTurned: false,
    wasClosed: false,
    problems: [],
  })
})

test.each([
  ['decimal points', ', ', (mm: number) => (mm / 1000).toFixed(3)],
  ['decimal commas', '; ', (mm: number) => (mm / 1000).toFixed(2).replace('.', ',')],
  ['decimal commas between spaces', ' ', (mm: number) => (mm / 1000).toFixed(1).replace('.', ',')],
])('a plan in metres with %s is taken for metres, and says so', (_, part, number) => {
  expect(cornersOfPaste(written(part, number))).toMatchObject({ corners: lCorners, unit: 'm' })
})

test('the unit a person chose goes before the guess', () => {
  const small = '0, 0\n150, 0\n150, 90'
  expect(cornersOfPaste(small)).toMatchObject({ unit: 'm', isUnitGuessed: true })
  const chosen = cornersOfPaste(small, 'mm')
  expect(chosen).toMatchObject({ unit: 'mm', isUnitGuessed: false })
  expect(chosen.corners[1]).toEqual({ x: 150, y: 0 })
})

test('corners in clockwise order are turned round from the first, and say so', () => {
  const clockwise = [lCorners[0]!, ...lCorners.slice(1).reverse()]
  const text = clockwise.map(({ x, y }) => `${x}, ${y}`).join('\n')
  expect(cornersOfPaste(text)).toMatchObject({ corners: lCorners, wasTurned: true })
})

test('a last line that repeats the first is left out, and says so', () => {
  expect(cornersOfPaste(`${written(', ')}\n0, 0\n`)).toMatchObject({
    corners: lCorners,
    wasClosed: true,
  })
})

test('headings, empty lines, corner numbers and units in the text do no harm', () => {
  const text = `x, y\n\n${lCorners.map(({ x, y }, i) => `${i + 1}: x=${x} mm, y=${y} mm`).join('\r\n')}\n`
  expect(cornersOfPaste(text)).toMatchObject({ corners: lCorners, problems: [] })
})

test('what cannot be read is refused with its line and its words', () => {
  const read = cornersOfPaste('0, 0\n9000\n9000, six 4\n1,5,2\n0, 4000, 12')
  expect(read.corners).toEqual([])
  expect(read.problems.map(({ line }) => line)).toEqual([2, 3, 4, 5])
  expect(read.problems[0]!.message).toContain('only one figure')
  expect(read.problems[1]!.message).toContain('“six 4” is not a number')
  expect(read.problems[2]!.message).toContain('two ways')
  expect(read.problems[3]!.message).toMatch(/two ways|3 figures/)
})

test('a corner given twice, too few and too many are refused', () => {
  expect(cornersOfPaste('0,0\n0,0\n9000,0\n9000,4000').problems).toEqual([
    { line: 2, message: 'The same corner as line 1: take one of them out.' },
  ])
  expect(cornersOfPaste('0,0\n9000,0').problems[0]!.message).toContain('at least 3')
  const many = Array.from({ length: 65 }, (_, i) => `${i * 400}, ${i * i}`).join('\n')
  expect(cornersOfPaste(many).problems[0]).toMatchObject({ line: 65 })
  expect(cornersOfPaste('  \n').problems).toEqual([])
})
