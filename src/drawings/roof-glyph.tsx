import { useId } from 'react'
import { svgPoints } from '../../shared/drawing/drawing-geometry.ts'
import type { RoofGlyphData, RoofGlyphLineKind } from '../../shared/drawing/roof-glyph.ts'

type Props = {
  glyph: RoofGlyphData
  /** Width and height; drawn to be known from 28 px up. */
  sizePx?: number
  /** What a screen reader says; leave out where the text beside it names the roof. */
  title?: string
  className?: string
}

const lineClasses: Record<RoofGlyphLineKind, string> = {
  ridge: 'stroke-ink [stroke-width:2.5]',
  hip: 'stroke-ink [stroke-width:1.25]',
  'broken-hip': 'stroke-ink [stroke-width:1.25]',
  valley: 'stroke-ink [stroke-width:1.5] [stroke-dasharray:3_2]',
}

/** A roof known by its shape: the plan's silhouette with its ridges, hips and valleys. */
export function RoofGlyph({ glyph, sizePx = 40, title, className = '' }: Props) {
  const titleId = useId()
  const points = glyph.outline.map(([x, y]) => ({ x, y }))
  const width = Math.max(0, ...points.map((p) => p.x))
  const height = Math.max(0, ...points.map((p) => p.y))
  const box = `${(width - 112) / 2} ${(height - 112) / 2} 112 112`
  return (
    <svg
      viewBox={box}
      width={sizePx}
      height={sizePx}
      role={title ? 'img' : undefined}
      aria-labelledby={title ? titleId : undefined}
      aria-hidden={title ? undefined : true}
      className={`shrink-0 ${className}`}
    >
      {title ? <title id={titleId}>{title}</title> : null}
      <polygon
        points={svgPoints(points)}
        vectorEffect="non-scaling-stroke"
        strokeLinejoin="round"
        className="fill-sheet stroke-ink [stroke-width:2]"
      />
      {glyph.lines.map(([x1, y1, x2, y2, kind], i) => (
        <line
          key={i}
          x1={x1}
          y1={y1}
          x2={x2}
          y2={y2}
          vectorEffect="non-scaling-stroke"
          strokeLinecap="round"
          className={lineClasses[kind]}
        />
      ))}
    </svg>
  )
}
