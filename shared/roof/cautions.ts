import type { Ground } from './build-pieces.ts'
import { cautionAbout, halfDeg } from './caution-words.ts'
import { crownShortcut } from './crown-cautions.ts'
import { eavesMeet, eavesNotLevel, lowPitch, overhangLong } from './eave-cautions.ts'
import type { Caution, Member } from './roof-types.ts'
import { sizeCautions } from './size-cautions.ts'
import { longerThanStock, spanLong } from './span-cautions.ts'

const pastSaw = (ground: Ground, members: Member[]): Caution[] => {
  const worst = (m: Member) =>
    Math.max(...m.cuts.filter((c) => c.pastSaw).map((c) => c.bladeTiltDeg))
  return cautionAbout(
    'past-saw',
    members.filter((m) => m.cuts.some((cut) => cut.pastSaw)),
    (m) =>
      `${m.mark} needs the blade at ${halfDeg(worst(m))}°, past the saw's ${halfDeg(ground.settings.sawMaxTiltDeg)}°.`,
    "Mark both faces and the top, cut it off square past the long point, then finish to the lines with a hand saw, or with the saw's base on the sawn end. Clamped, guard working, within the saw's manual.",
  )
}

/** Where many lines meet at odd angles no order of joints closes every head; better said than hidden. */
const jointOpen = (members: Member[], openMarks: ReadonlySet<string | undefined>): Caution[] =>
  cautionAbout(
    'joint-open',
    members.filter((m) => openMarks.has(m.mark)),
    (m) => `The head of ${m.mark} does not close on its neighbours by any usual order of joints.`,
    'Set that joint out full size on the deck before cutting, or change the plan so that fewer lines meet there.',
  )

/** All cautions of a frame, in a fixed order; each says what is wrong and what would answer it. */
export const cautionsOf = (
  ground: Ground,
  standMm: number,
  members: Member[],
  openMarks: ReadonlySet<string | undefined>,
): Caution[] => [
  ...sizeCautions(ground, standMm, members),
  ...eavesNotLevel(ground),
  ...eavesMeet(ground),
  ...pastSaw(ground, members),
  ...longerThanStock(ground, members),
  ...lowPitch(ground),
  ...overhangLong(ground, members),
  ...spanLong(ground, members),
  ...crownShortcut(ground, members),
  ...jointOpen(members, openMarks),
]
