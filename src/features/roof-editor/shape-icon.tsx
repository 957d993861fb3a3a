import type { RoofShape } from '../../../shared/revisions/roof-form.ts'

/** Silhouettes on a field of 40 by 28, y down. */
const outlines: Record<RoofShape, string> = {
  rectangle: '4,5 36,5 36,23 4,23',
  l: '4,3 16,3 16,13 36,13 36,25 4,25',
  t: '4,13 14,13 14,3 26,3 26,13 36,13 36,25 4,25',
  u: '4,3 14,3 14,13 26,13 26,3 36,3 36,25 4,25',
  cross: '4,9 15,9 15,2 25,2 25,9 36,9 36,19 25,19 25,26 15,26 15,19 4,19',
  'octagonal-end': '4,5 30,5 36,11 36,17 30,23 4,23',
  'splayed-end': '4,5 32,5 36,9 36,19 32,23 4,23',
  corners: '5,24 3,8 14,3 19,11 34,6 37,20 22,25',
}

export function ShapeIcon({ shape }: { shape: RoofShape }) {
  return (
    <svg viewBox="0 0 40 28" width={40} height={28} aria-hidden="true" className="shrink-0">
      <polygon
        points={outlines[shape]}
        strokeLinejoin="round"
        className="fill-none stroke-current [stroke-width:2]"
      />
    </svg>
  )
}
