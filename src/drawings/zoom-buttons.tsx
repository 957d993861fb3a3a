import { Minus, Plus } from 'lucide-react'
import { Button } from '../ui/button.tsx'

export const zoomSteps = [1, 1.5, 2, 3] as const

type Props = { zoom: number; onZoom: (zoom: number) => void }

/** Draws a plan larger in its own window, so that every mark has room. */
export function ZoomButtons({ zoom, onZoom }: Props) {
  const smaller = zoomSteps.filter((step) => step < zoom).at(-1)
  const larger = zoomSteps.find((step) => step > zoom)
  return (
    <div className="flex gap-2 print:hidden">
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
