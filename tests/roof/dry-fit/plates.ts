import type { Roof } from '../../../shared/roof/roof-types.ts'
import type { Flat, Solid, SolidKit } from './solid-kit.ts'

const PLATE_DEPTH_MM = 90
/** Corners down to 6° keep their point; a sharper one than any roof has. */
const MITER_LIMIT = 20

/** The wall plates in plan: the outline's ring, plate width inward. */
export function plateFlat(kit: SolidKit, roof: Roof): Flat {
  const outer = new kit.CrossSection([roof.outline.map((p) => [p.x, p.y] as [number, number])])
  const inner = outer.offset(-roof.plateWidthMm, 'Miter', MITER_LIMIT)
  const ring = outer.subtract(inner)
  outer.delete()
  inner.delete()
  return ring
}

/** The same as a solid, its top at z = 0. */
export function plateSolid(ring: Flat): Solid {
  return ring.extrude(PLATE_DEPTH_MM).translate([0, 0, -PLATE_DEPTH_MM])
}
