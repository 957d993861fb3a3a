import { type PlanLayer, planLayerWords } from '../../shared/drawing/plan-layers.ts'

type Props = {
  layers: readonly PlanLayer[]
  hidden: ReadonlySet<PlanLayer>
  onChange: (hidden: ReadonlySet<PlanLayer>) => void
}

/** Which kinds of timber the plan shows. */
export function PlanLayerKeys({ layers, hidden, onChange }: Props) {
  if (layers.length === 0) return null
  const turn = (layer: PlanLayer) => {
    const next = new Set(hidden)
    if (!next.delete(layer)) next.add(layer)
    onChange(next)
  }
  return (
    <fieldset className="flex flex-wrap gap-2 print:hidden">
      <legend className="sr-only">Show on the plan</legend>
      {layers.map((layer) => {
        const isShown = !hidden.has(layer)
        return (
          <label
            key={layer}
            className={`flex min-h-11 cursor-pointer items-center gap-2 rounded-md border px-3 text-sm font-semibold has-focus-visible:outline-3 has-focus-visible:outline-chalk ${isShown ? 'border-ink' : 'border-ink-soft text-ink-soft'}`}
          >
            <input
              type="checkbox"
              checked={isShown}
              onChange={() => turn(layer)}
              className="size-5 accent-chalk"
            />
            {planLayerWords[layer]}
          </label>
        )
      })}
    </fieldset>
  )
}
