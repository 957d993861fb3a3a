import type { Point2, Point3 } from './roof-types.ts'

/** A plane in space; `normal` has length 1. */
export type Plane = { point: Point3; normal: Point3 }

export const degrees = (rad: number): number => (rad * 180) / Math.PI
export const radians = (deg: number): number => (deg * Math.PI) / 180

/** A point of the plan at a height. Points are made by hand and not spread: V8 copies a spread with a field more some fifty times slower. */
export const point3 = ({ x, y }: Point2, z: number): Point3 => ({ x, y, z })

export const add2 = (a: Point2, b: Point2): Point2 => ({ x: a.x + b.x, y: a.y + b.y })
export const sub2 = (a: Point2, b: Point2): Point2 => ({ x: a.x - b.x, y: a.y - b.y })
export const scale2 = (a: Point2, k: number): Point2 => ({ x: a.x * k, y: a.y * k })
export const dot2 = (a: Point2, b: Point2): number => a.x * b.x + a.y * b.y
export const cross2 = (a: Point2, b: Point2): number => a.x * b.y - a.y * b.x
export const length2 = (a: Point2): number => Math.hypot(a.x, a.y)
export const distance2 = (a: Point2, b: Point2): number => Math.hypot(a.x - b.x, a.y - b.y)
/** A quarter turn to the left, seen from above. */
export const left2 = (a: Point2): Point2 => ({ x: -a.y, y: a.x })
export const unit2 = (a: Point2): Point2 => scale2(a, 1 / length2(a))

const sub3 = (a: Point3, b: Point3): Point3 => ({ x: a.x - b.x, y: a.y - b.y, z: a.z - b.z })
export const scale3 = (a: Point3, k: number): Point3 => ({ x: a.x * k, y: a.y * k, z: a.z * k })
export const dot3 = (a: Point3, b: Point3): number => a.x * b.x + a.y * b.y + a.z * b.z
export const cross3 = (a: Point3, b: Point3): Point3 => ({
  x: a.y * b.z - a.z * b.y,
  y: a.z * b.x - a.x * b.z,
  z: a.x * b.y - a.y * b.x,
})
export const unit3 = (a: Point3): Point3 => scale3(a, 1 / Math.sqrt(dot3(a, a)))
export const distance3 = (a: Point3, b: Point3): number => {
  const d = sub3(a, b)
  return Math.sqrt(dot3(d, d))
}

/** `origin` moved by `k` along `direction`. */
export const along3 = (origin: Point3, direction: Point3, k: number): Point3 => ({
  x: origin.x + direction.x * k,
  y: origin.y + direction.y * k,
  z: origin.z + direction.z * k,
})

/** Angle between two directions of length 1, degrees, 0 to 180; exact near 0 and 180 too. */
export const angleBetweenDeg = (a: Point3, b: Point3): number => {
  const c = cross3(a, b)
  return degrees(Math.atan2(Math.sqrt(dot3(c, c)), dot3(a, b)))
}

/** How far along a line from `origin` a plane crosses it, in lengths of `direction`. */
export const planeCrossing = (plane: Plane, origin: Point3, direction: Point3): number =>
  dot3(plane.normal, sub3(plane.point, origin)) / dot3(plane.normal, direction)
