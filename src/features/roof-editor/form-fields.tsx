import type { ReactNode } from 'react'
import { textAt } from '../../../shared/revisions/form-paths.ts'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { fieldId, useRoofForm } from './roof-form-context.ts'

type Props = { path: string; label: string; hint?: string; className?: string }

/** A measure, kept as typed. */
export function MeasureField({
  path,
  label,
  hint,
  className,
  placeholder,
}: Props & { placeholder?: string }) {
  const { form, problemAt, setText } = useRoofForm()
  return (
    <div id={fieldId(path)} className={`min-w-0 ${className ?? ''}`}>
      <Field label={label} hint={hint} error={problemAt(path)}>
        <TextInput
          inputMode="decimal"
          autoComplete="off"
          placeholder={placeholder}
          className="tabular-nums"
          value={textAt(form, path)}
          maxLength={20}
          onChange={(event) => setText(path, event.target.value)}
        />
      </Field>
    </div>
  )
}

export function ChoiceField({
  path,
  label,
  hint,
  className,
  options,
}: Props & { options: readonly (readonly [value: string, words: string])[] }) {
  const { form, problemAt, setText } = useRoofForm()
  return (
    <div id={fieldId(path)} className={`min-w-0 ${className ?? ''}`}>
      <Field label={label} hint={hint} error={problemAt(path)}>
        <Select value={textAt(form, path)} onChange={(event) => setText(path, event.target.value)}>
          {options.map(([value, words]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </Select>
      </Field>
    </div>
  )
}

/** A titled group of fields. */
export function FieldGroup({
  title,
  note,
  children,
}: {
  title: string
  note?: string
  children: ReactNode
}) {
  return (
    <section className="rounded-md border border-rule bg-sheet p-4">
      <h2 className="text-lg font-extrabold">{title}</h2>
      {note ? <p className="text-sm text-ink-soft">{note}</p> : null}
      <div className="mt-3 grid grid-cols-2 gap-3">{children}</div>
    </section>
  )
}
