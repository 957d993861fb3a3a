import type { Ground } from './build-pieces.ts'
import { cautionAbout, cautionOf, halfDeg } from './caution-words.ts'
import { crownShortcut } from './crown-cautions.ts'
import { eavesMeet, eavesNotLevel, lowPitch, overhangLong } from './eave-cautions.ts'
import type { OpenEnds } from './open-ends.ts'
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

/** Where many lines meet at odd angles no order of joints closes every end; better said than hidden. */
const jointOpen = (members: Member[], { heads, feet }: OpenEnds<string>): Caution[] => [
  ...cautionAbout(
    'joint-open',
    members.filter((m) => heads.includes(m.mark)),
    (m) => `The head of ${m.mark} does not close on its neighbours by any usual order of joints.`,
    'Set that joint out full size on the deck before cutting, or change the plan so that fewer lines meet there.',
  ),
  ...cautionAbout(
    'joint-open',
    members.filter((m) => feet.includes(m.mark)),
    (m) => `The foot of ${m.mark} finds next to nothing to bear on where it is cut.`,
    'Set it out on the standing frame before cutting it, or change the plan so that its lines part more.',
  ),
]

/** A tail that happens to end hard against the side of a piece that is not cut for it. */
const tailsTouch = (members: Member[], { touches }: OpenEnds<string>): Caution[] =>
  touches.map(([tail, other]) =>
    cautionOf(
      'tail-touches',
      members.filter(({ mark }) => mark === tail || mark === other),
      `The tail of ${tail} ends hard against the side of ${other}, which is not cut for it.`,
      `Try ${other} there before nailing, and ease the corner of the tail where it binds; or change an overhang or the rafter spacing.`,
    ),
  )

/** All cautions of a frame, in a fixed order; each says what is wrong and what would answer it. */
export const cautionsOf = (
  ground: Ground,
  standMm: number,
  members: Member[],
  open: OpenEnds<string>,
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
  ...jointOpen(members, open),
  ...tailsTouch(members, open),
]
