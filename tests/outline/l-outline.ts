/** An L on squared paper: 9000 by 7000, wings 4000 wide. */
export const lCorners = [
  { x: 0, y: 0 },
  { x: 9000, y: 0 },
  { x: 9000, y: 4000 },
  { x: 4000, y: 4000 },
  { x: 4000, y: 7000 },
  { x: 0, y: 7000 },
]
