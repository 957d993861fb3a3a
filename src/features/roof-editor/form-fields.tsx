import { memo, type ReactNode } from 'react'
import { textAt } from '../../../shared/revisions/form-paths.ts'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { fieldId, useRoofForm } from './roof-form-context.ts'

type Props = { path: string; label: string; hint?: string | undefined; className?: string }

type MeasureProps = Props & {
  placeholder?: string | undefined
  /** Stands elsewhere too: links lead to the other one. */
  isCopy?: boolean
}
export type BoxProps = {
  text: string
  problem: string | undefined
  setText: (path: string, text: string) => void
}

/** A measure, kept as typed. */
export function MeasureField(props: MeasureProps) {
  const { form, problemAt, hintAt, setText } = useRoofForm()
  const { path, hint } = props
  return (
    <MeasureBox
      {...props}
      hint={[hint, hintAt(path)].filter(Boolean).join(' ') || undefined}
      text={textAt(form, path)}
      problem={problemAt(path)}
      setText={setText}
    />
  )
}

/**
 * Drawn again only when its own text or problem changes, so that a key in one field costs one field. In long
 * lists it stands by itself, with what it shows handed to it.
 */
export const MeasureBox = memo(function MeasureBox(props: MeasureProps & BoxProps) {
  const { path, label, hint, className, placeholder, isCopy, text, problem, setText } = props
  return (
    <div id={isCopy ? undefined : fieldId(path)} className={`min-w-0 ${className ?? ''}`}>
      <Field label={label} hint={hint} error={problem}>
        <TextInput
          inputMode="decimal"
          autoComplete="off"
          placeholder={placeholder}
          className="tabular-nums"
          value={text}
          maxLength={20}
          onChange={(event) => setText(path, event.target.value)}
        />
      </Field>
    </div>
  )
})

type Options = readonly (readonly [value: string, words: string])[]
type ChoiceProps = Props & { options: Options }

export function ChoiceField(props: ChoiceProps) {
  const { form, problemAt, setText } = useRoofForm()
  const { path } = props
  return (
    <ChoiceBox {...props} text={textAt(form, path)} problem={problemAt(path)} setText={setText} />
  )
}

export const ChoiceBox = memo(function ChoiceBox(props: ChoiceProps & BoxProps) {
  const { path, label, hint, className, options, text, problem, setText } = props
  return (
    <div id={fieldId(path)} className={`min-w-0 ${className ?? ''}`}>
      <Field label={label} hint={hint} error={problem}>
        <Select value={text} onChange={(event) => setText(path, event.target.value)}>
          {options.map(([value, words]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </Select>
      </Field>
    </div>
  )
})

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
