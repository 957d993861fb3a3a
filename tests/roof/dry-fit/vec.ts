/** Plain vectors for the dry fit; nothing here is shared with the program under test. */
export type Vec = readonly [number, number, number]

export const toVec = (p: { x: number; y: number; z: number }): Vec => [p.x, p.y, p.z]
export const add = (a: Vec, b: Vec): Vec => [a[0] + b[0], a[1] + b[1], a[2] + b[2]]
export const sub = (a: Vec, b: Vec): Vec => [a[0] - b[0], a[1] - b[1], a[2] - b[2]]
export const scale = (a: Vec, k: number): Vec => [a[0] * k, a[1] * k, a[2] * k]
export const dot = (a: Vec, b: Vec): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
export const cross = (a: Vec, b: Vec): Vec => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
]
export const length = (a: Vec): number => Math.hypot(a[0], a[1], a[2])
export const unit = (a: Vec): Vec => scale(a, 1 / length(a))
export const combine = (...terms: [number, Vec][]): Vec =>
  terms.reduce<Vec>((sum, [k, v]) => add(sum, scale(v, k)), [0, 0, 0])

const RAD = Math.PI / 180
export const sinDeg = (deg: number): number => Math.sin(deg * RAD)
export const cosDeg = (deg: number): number => Math.cos(deg * RAD)
export const tanDeg = (deg: number): number => Math.tan(deg * RAD)
export const toDeg = (rad: number): number => rad / RAD
export const angleDeg = (a: Vec, b: Vec): number =>
  toDeg(Math.atan2(length(cross(a, b)), dot(a, b)))
