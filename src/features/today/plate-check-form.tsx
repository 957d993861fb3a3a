import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useMemo, useState } from 'react'
import type { DayRoof } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import { plateToleranceMm } from '../../../shared/day-sheets/plate-check.ts'
import { formatMm } from '../../../shared/units/format-length.ts'
import { newDeviceId } from '../../lib/device-id.ts'
import { failureText, issueAt } from '../../lib/failure-text.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextArea, TextInput } from '../../ui/inputs.tsx'
import { ErrorState } from '../../ui/states.tsx'
import {
  plateCheckOf,
  type PlateField,
  plateFields,
  plateIssues,
  type PlateTexts,
  typedMm,
} from './plate-fields.ts'
import { recordPlateCheck, todayQueries } from './today-queries.ts'

/** How a typed length lies to the plan, in words. */
function offWords(planMm: number, text: string): string {
  const plan = `Plan ${formatMm(planMm)} mm`
  const mm = typedMm(text)
  if (mm === null) return plan
  const off = mm - planMm
  if (Math.abs(off) < 0.5) return `${plan}: the same`
  const size = `${formatMm(Math.abs(off))} mm ${off > 0 ? 'longer' : 'shorter'}`
  return Math.abs(off) > plateToleranceMm ? `${plan}: ${size}, off` : `${plan}: ${size}`
}

type InputProps = {
  field: PlateField
  text: string
  error: string | undefined
  onText: (text: string) => void
}

function LengthInput({ field, text, error, onText }: InputProps) {
  const mm = typedMm(text)
  const isOff = mm !== null && Math.abs(mm - field.planMm) > plateToleranceMm
  return (
    <Field
      label={field.isOptional ? `${field.label} (if it can be reached)` : field.label}
      hint={offWords(field.planMm, text)}
      error={error}
    >
      <TextInput
        inputMode="decimal"
        autoComplete="off"
        value={text}
        onChange={(event) => onText(event.target.value)}
        className={`min-h-14 text-[1.75rem] font-extrabold tabular-nums ${isOff ? 'border-2 border-ochre' : ''}`}
      />
    </Field>
  )
}

function useRecord(roof: DayRoof, onDone: () => void) {
  const client = useQueryClient()
  // One id until it is recorded, so that a second tap records nothing more.
  const [id] = useState(newDeviceId)
  return useMutation({
    mutationFn: ({ texts, note }: { texts: PlateTexts; note: string }) =>
      recordPlateCheck(
        roof.jobId,
        plateCheckOf(roof.roof.outline, texts, { id, letter: roof.letter, note }),
      ),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: todayQueries.all() })
      onDone()
    },
  })
}

/** Sides and diagonals as the tape reads them, each beside the plan's. */
export function PlateCheckForm({ roof, onDone }: { roof: DayRoof; onDone: () => void }) {
  const fields = useMemo(() => plateFields(roof.roof.outline), [roof])
  const [texts, setTexts] = useState<PlateTexts>({})
  const [note, setNote] = useState('')
  const [wasSent, setWasSent] = useState(false)
  const record = useRecord(roof, onDone)
  const issues = wasSent ? plateIssues(fields, texts) : {}
  const submit = (event: FormEvent) => {
    event.preventDefault()
    setWasSent(true)
    if (Object.keys(plateIssues(fields, texts)).length === 0) record.mutate({ texts, note })
  }
  const input = (field: PlateField) => (
    <LengthInput
      key={field.path}
      field={field}
      text={texts[field.path] ?? ''}
      error={issues[field.path] ?? issueAt(record.error, field.path)}
      onText={(text) => setTexts((now) => ({ ...now, [field.path]: text }))}
    />
  )
  const diagonals = fields.filter((field) => field.path.startsWith('diagonals'))
  const failure = failureText(
    record.error,
    fields.map((field) => field.path),
  )
  return (
    <form onSubmit={submit} noValidate className="space-y-5">
      <fieldset className="space-y-3">
        <legend className="text-lg font-extrabold">Sides, along the outer plate face</legend>
        {fields.filter((field) => !diagonals.includes(field)).map(input)}
      </fieldset>
      {diagonals.length > 0 ? (
        <fieldset className="space-y-3">
          <legend className="text-lg font-extrabold">
            Diagonals, outer corner to outer corner
          </legend>
          {diagonals.map(input)}
        </fieldset>
      ) : null}
      <Field label="Remarks" error={issueAt(record.error, 'note')}>
        <TextArea maxLength={500} value={note} onChange={(event) => setNote(event.target.value)} />
      </Field>
      {failure ? <ErrorState message={failure} /> : null}
      {Object.keys(issues).length > 0 ? (
        <p role="alert" className="font-semibold text-stop">
          {Object.keys(issues).length === 1
            ? 'One length is missing.'
            : `${Object.keys(issues).length} lengths are missing.`}
        </p>
      ) : null}
      <Button type="submit" size="site" className="w-full" busy={record.isPending}>
        Record the plates
      </Button>
    </form>
  )
}
