import { useState } from 'react'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'

type Props = {
  label: string
  unit: string
  hint?: string | undefined
  error?: string | undefined
  value: number
  onChange: (value: number) => void
}

/** A number with its unit; what is typed stays as typed, and anything that is no number is sent as such to be refused. */
export function NumberInput({ label, unit, hint, error, value, onChange }: Props) {
  const [text, setText] = useState(String(value))
  return (
    <Field label={`${label} (${unit})`} hint={hint} error={error}>
      <TextInput
        inputMode="decimal"
        value={text}
        onChange={(event) => {
          setText(event.target.value)
          onChange(
            event.target.value.trim() === ''
              ? Number.NaN
              : Number(event.target.value.replace(',', '.')),
          )
        }}
      />
    </Field>
  )
}
