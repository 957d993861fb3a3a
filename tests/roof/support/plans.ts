/** Plans that many tests start from, in mm, counter-clockwise. */
export type Plan = [number, number][]

export const rectangle = (longMm: number, wideMm: number): Plan => [
  [0, 0],
  [longMm, 0],
  [longMm, wideMm],
  [0, wideMm],
]

/** Two wings 6 m wide, the second on the left end of the first. */
export const lPlan: Plan = [
  [0, 0],
  [12000, 0],
  [12000, 6000],
  [6000, 6000],
  [6000, 11000],
  [0, 11000],
]

/** A main building 6 m wide with a wing 4 m wide in the middle of its back. */
export const tPlan: Plan = [
  [0, 0],
  [12000, 0],
  [12000, 6000],
  [8000, 6000],
  [8000, 9500],
  [4000, 9500],
  [4000, 6000],
  [0, 6000],
]
