import { Minus, Plus } from 'lucide-react'
import { Button } from '../ui/button.tsx'

export const zoomSteps = [1, 1.5, 2, 3, 4, 6, 8, 12, 16, 24, 32] as const

type Props = { zoom: number; maxZoom: number; onZoom: (zoom: number) => void }

/** Draws a plan larger in its own window, so that every mark has room. */
export function ZoomButtons({ zoom, maxZoom, onZoom }: Props) {
  const smaller = zoomSteps.filter((step) => step < zoom - 0.01).at(-1)
  const larger = zoomSteps.find((step) => step > zoom + 0.01 && step <= maxZoom)
  return (
    <div className="ml-auto flex gap-2 print:hidden">
      <Button
        kind="plain"
        aria-label="Draw smaller"
        size="site"
        className="min-w-14 px-0!"
        disabled={smaller === undefined}
        onClick={() => onZoom(smaller ?? zoom)}
      >
        <Minus aria-hidden="true" size={18} />
      </Button>
      <Button
        kind="plain"
        aria-label="Draw larger"
        size="site"
        className="min-w-14 px-0!"
        disabled={larger === undefined}
        onClick={() => onZoom(larger ?? zoom)}
      >
        <Plus aria-hidden="true" size={18} />
      </Button>
    </div>
  )
}
