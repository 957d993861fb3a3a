import type { Roof } from '../../../shared/roof/roof-types.ts'
import { makeRoof, regularOutline } from '../support/roofs.ts'

const rectangle: [number, number][] = [
  [0, 0],
  [9000, 0],
  [9000, 6000],
  [0, 6000],
]

const splayed = (cutX: number, cutY: number): [number, number][] => [
  [0, 0],
  [9000 - cutX, 0],
  [9000, cutY],
  [9000, 6000 - cutY],
  [9000 - cutX, 6000],
  [0, 6000],
]

const splayedBothEnds: [number, number][] = [
  [1200, 0],
  [7800, 0],
  [9000, 1200],
  [9000, 4800],
  [7800, 6000],
  [1200, 6000],
  [0, 4800],
  [0, 1200],
]

const octagonalBothEnds: [number, number][] = [
  [0, 0],
  [6000, 0],
  [7757.359, 1757.359],
  [7757.359, 4242.641],
  [6000, 6000],
  [0, 6000],
  [-1757.359, 4242.641],
  [-1757.359, 1757.359],
]

/** Roofs beyond the reference ones, each for a joint that those do not hold. */
export const furtherRoofs: Record<string, () => Roof> = {
  'rectangle with four different pitches': () => makeRoof(rectangle, [22.5, 35, 30, 40]),
  'rectangle with sides of different pitch and gable ends': () =>
    makeRoof(rectangle, [20, 'gable', 35, 'gable']),
  'hip end left, gable right': () => makeRoof(rectangle, [30, 'gable', 30, 30]),
  'gable left, steep hip end right': () => makeRoof(rectangle, [22.5, 45, 22.5, 'gable']),
  'splayed end, shallow splay': () => makeRoof(splayed(2000, 900), [25, 25, 25, 25, 25, 'gable']),
  'splayed end, long splay': () => makeRoof(splayed(900, 1500), [25, 25, 25, 25, 25, 'gable']),
  'splayed end, steep splays': () => makeRoof(splayed(1200, 1200), [25, 35, 25, 35, 25, 'gable']),
  'splayed both ends': () => makeRoof(splayedBothEnds, [25, 25, 25, 25, 25, 25, 25, 25]),
  'octagonal both ends': () => makeRoof(octagonalBothEnds, [30, 30, 30, 30, 30, 30, 30, 30]),
  'pyramid, steep': () =>
    makeRoof(
      [
        [0, 0],
        [4200, 0],
        [4200, 4200],
        [0, 4200],
      ],
      [45, 45, 45, 45],
    ),
  'octagon turret': () => makeRoof(regularOutline(8, 4000), Array<number>(8).fill(40)),
  'hexagon turret': () => makeRoof(regularOutline(6, 4000), Array<number>(6).fill(35)),
  'pentagon, none in line': () => makeRoof(regularOutline(5, 4800), Array<number>(5).fill(30)),
  triangle: () =>
    makeRoof(
      [
        [0, 0],
        [7000, 0],
        [3000, 6000],
      ],
      [30, 30, 30],
    ),
  'skew quadrilateral': () =>
    makeRoof(
      [
        [0, 0],
        [9000, 600],
        [8200, 6400],
        [-500, 5600],
      ],
      [25, 25, 25, 25],
    ),
  'skew quadrilateral, unequal pitches': () =>
    makeRoof(
      [
        [0, 0],
        [9000, 600],
        [8200, 6400],
        [-500, 5600],
      ],
      [25, 35, 22.5, 30],
    ),
  'skew hip end on a straight building': () =>
    makeRoof(
      [
        [0, 0],
        [10500, 0],
        [9000, 6000],
        [0, 6000],
      ],
      [25, 25, 25, 'gable'],
    ),
  'one side in two eaves of one line': () =>
    makeRoof(
      [
        [0, 0],
        [4000, 0],
        [9000, 0],
        [9000, 6000],
        [0, 6000],
      ],
      [25, 25, 25, 25, 25],
    ),
  'turned and shifted hip rectangle': () => {
    const [c, s] = [Math.cos(0.4), Math.sin(0.4)]
    const outline = rectangle.map(([x, y]): [number, number] => [
      12000 + x * c - y * s,
      -7000 + x * s + y * c,
    ])
    return makeRoof(outline, [25, 25, 25, 25])
  },
  'full bays with an odd one': () => makeRoof(rectangle, [25, 25, 25, 25], { spacing: 'full' }),
  'tails left long': () => makeRoof(rectangle, [25, 25, 25, 25], { tailAllowanceMm: 50 }),
  'height over plate typed in': () => makeRoof(rectangle, [30, 30, 30, 30], { standMm: 130 }),
}
