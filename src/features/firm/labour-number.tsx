import { useState } from 'react'
import { type LabourSource, labourSourceWords } from '../../../shared/labour/labour-sources.ts'
import { NumberInput } from './number-input.tsx'

type Props = {
  label: string
  /** What it is of, for who hears the page: 'Hips'. */
  of?: string
  value: number
  standard: number
  source: LabourSource
  onChange: (value: number) => void
  error: string | undefined
}

/** Minutes with the default they started from and its source, and the way back to it. */
export function LabourNumber({ label, of, value, standard, source, onChange, error }: Props) {
  const [resets, setResets] = useState(0)
  const back = () => {
    onChange(standard)
    setResets(resets + 1)
  }
  return (
    <div>
      <NumberInput
        key={resets}
        label={label}
        unit="min"
        value={value}
        hint={`Default ${standard}, ${labourSourceWords[source]}.`}
        onChange={onChange}
        error={error}
      />
      {value === standard ? null : (
        <button
          type="button"
          onClick={back}
          aria-label={`${[of, label].filter(Boolean).join(', ')}: back to the default`}
          className="min-h-11 font-semibold text-chalk underline"
        >
          Back to the default
        </button>
      )}
    </div>
  )
}
