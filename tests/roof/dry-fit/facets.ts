import { directionToBuilding, toBuilding, type Piece } from './rebuild-member.ts'
import type { Flat, Solid, SolidKit } from './solid-kit.ts'
import { add, combine, cross, dot, scale, sub, unit, type Vec } from './vec.ts'

/** A drawing plane in the building: x and y across it, `normal` off the timber. */
export type Frame = { point: Vec; x: Vec; y: Vec; normal: Vec }

export function frameOf(point: Vec, normal: Vec): Frame {
  const helper: Vec = Math.abs(normal[2]) < 0.9 ? [0, 0, 1] : [1, 0, 0]
  const x = unit(cross(helper, normal))
  return { point, x, y: cross(normal, x), normal }
}

/** Just inside a face: deeper, the face of a second cheek in nearly the same plane would show too. */
const INSIDE_MM = 0.001

/** Lays a plane level at z = 0, what is behind it under it, and slices there. */
export function sliceAt(solid: Solid, frame: Frame, depthMm: number): Flat {
  const rows = [frame.x, frame.y, frame.normal]
  const column = (i: 0 | 1 | 2): [number, number, number, number] => [
    rows[0]![i],
    rows[1]![i],
    rows[2]![i],
    0,
  ]
  const shift = rows.map((r) => -dot(r, frame.point)) as [number, number, number]
  const laid = solid.transform([...column(0), ...column(1), ...column(2), ...shift, 1])
  const flat = laid.slice(-depthMm)
  laid.delete()
  return flat
}

export const onFrame = (frame: Frame, p: readonly [number, number]): Vec =>
  add(frame.point, combine([p[0], frame.x], [p[1], frame.y]))
export const inFrame = (frame: Frame, p: Vec): [number, number] => {
  const off = sub(p, frame.point)
  return [dot(off, frame.x), dot(off, frame.y)]
}

/** A flat face of a finished piece: where it is and its outlines in the building. */
export type Facet = { frame: Frame; outlines: Vec[][] }

/** The planes that a piece can have a face in: both sides, top and underside, and each cut. */
function planesOf(piece: Piece): { point: Vec; normal: Vec }[] {
  const half = piece.member.section.thicknessMm / 2
  const { depthMm } = piece.member.section
  const own: { point: Vec; normal: Vec }[] = [
    { point: [0, half, 0], normal: [0, 1, 0] },
    { point: [0, -half, 0], normal: [0, -1, 0] },
    { point: [0, 0, 0], normal: [0, 0, 1] },
    { point: [0, 0, -depthMm], normal: [0, 0, -1] },
    ...piece.sawn,
  ]
  return own.map(({ point, normal }) => ({
    point: toBuilding(piece.pose, point),
    normal: directionToBuilding(piece.pose, normal),
  }))
}

/** Faces of a piece, sliced when first asked for. */
export class Facets {
  private readonly known = new Map<Piece, { point: Vec; normal: Vec; facet: Facet | null }[]>()

  /** Faces that lie within `cos` of facing a direction. */
  facing(piece: Piece, direction: Vec, cos: number): Facet[] {
    const faces =
      this.known.get(piece) ?? planesOf(piece).map((plane) => ({ ...plane, facet: null }))
    this.known.set(piece, faces)
    return faces
      .filter((face) => dot(face.normal, direction) > cos)
      .map((face) => (face.facet ??= facetOf(piece, frameOf(face.point, face.normal))))
  }
}

export function facetOf(piece: Piece, frame: Frame): Facet {
  const flat = sliceAt(piece.solid, frame, INSIDE_MM)
  const outlines = flat.toPolygons().map((ring) => ring.map((p) => onFrame(frame, [p[0]!, p[1]!])))
  flat.delete()
  return { frame, outlines }
}

/** A facet drawn in another plane, square to that plane. */
export function drawnIn(kit: SolidKit, frame: Frame, facet: Facet): Flat {
  const rings = facet.outlines.map((ring) => ring.map((p) => inFrame(frame, p)))
  // the library takes no empty list
  return new kit.CrossSection(rings.length > 0 ? rings : [[]], 'EvenOdd')
}

/** How far a facet's plane stands off a point of a frame, square to the frame; 0 where they touch. */
export function gapAt(frame: Frame, facet: Facet, p: readonly [number, number]): number {
  const from = onFrame(frame, p)
  const { normal, point } = facet.frame
  const facing = dot(normal, frame.normal)
  return dot(normal, sub(point, from)) / facing
}

export const pushedIn = (frame: Frame, depthMm: number): Frame => ({
  ...frame,
  point: add(frame.point, scale(frame.normal, -depthMm)),
})
