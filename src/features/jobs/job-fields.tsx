import type { ReactNode } from 'react'
import type { UseFormReturn } from 'react-hook-form'
import {
  coveringNames,
  coverings,
  type JobFieldName,
  type JobFieldsInput,
} from '../../../shared/jobs/job-schemas.ts'
import { isTouched } from '../../lib/pointer.ts'
import { Field } from '../../ui/field.tsx'
import { Select, TextArea, TextInput } from '../../ui/inputs.tsx'
import { jobFieldLabels } from './job-form-values.ts'

type Form = UseFormReturn<JobFieldsInput>
type FieldProps = { form: Form; name: JobFieldName; hint?: string; className?: string }
type TextProps = FieldProps & {
  type?: 'text' | 'tel' | 'email' | 'date'
  inputMode?: 'decimal'
  autoFocus?: boolean
}

function JobText({ form, name, hint, className, ...rest }: TextProps) {
  const error = form.formState.errors[name]?.message
  return (
    <Field label={jobFieldLabels[name]} hint={hint} error={error} className={className ?? ''}>
      <TextInput autoComplete="off" {...rest} {...form.register(name)} />
    </Field>
  )
}

function JobArea({ form, name, hint, className = 'sm:col-span-2' }: FieldProps) {
  const error = form.formState.errors[name]?.message
  return (
    <Field label={jobFieldLabels[name]} hint={hint} error={error} className={className}>
      <TextArea {...form.register(name)} />
    </Field>
  )
}

function Group({ title, children }: { title: string; children: ReactNode }) {
  return (
    <fieldset>
      <legend className="mb-2 text-lg font-extrabold">{title}</legend>
      <div className="grid gap-4 sm:grid-cols-2">{children}</div>
    </fieldset>
  )
}

/** Every field of a job, in the order a phone call gives them. */
export function JobFields({ form, isNew }: { form: Form; isNew: boolean }) {
  const { errors } = form.formState
  return (
    <div className="space-y-6">
      <Group title="Job">
        <JobText
          form={form}
          name="title"
          className="sm:col-span-2"
          autoFocus={isNew && !isTouched()}
        />
        <Field label={jobFieldLabels.covering} error={errors.covering?.message}>
          <Select {...form.register('covering')}>
            {coverings.map((covering) => (
              <option key={covering} value={covering}>
                {coveringNames[covering]}
              </option>
            ))}
          </Select>
        </Field>
        <JobText form={form} name="wantedBy" type="date" />
        <JobText
          form={form}
          name="number"
          {...(isNew ? { hint: 'Left empty, it gets the next one.' } : {})}
        />
      </Group>
      <Group title="Site">
        <JobText form={form} name="siteAddress" className="sm:col-span-2" />
        <JobText form={form} name="siteContactName" />
        <JobText form={form} name="siteContactPhone" type="tel" />
        <JobArea form={form} name="accessNotes" hint="Gates, parking, what to watch for." />
        <JobArea form={form} name="crewNotes" hint="The crew reads these on Today." />
      </Group>
      <Group title="Customer">
        <JobText form={form} name="customerName" className="sm:col-span-2" />
        <JobText form={form} name="customerPhone" type="tel" />
        <JobText form={form} name="customerEmail" type="email" />
      </Group>
      <Group title="Price">
        <JobText form={form} name="price" inputMode="decimal" hint="Like 18450 or 18450.50." />
        <JobText form={form} name="priceSentOn" type="date" />
        <JobText form={form} name="acceptedOn" type="date" />
        {isNew ? null : <JobText form={form} name="completedOn" type="date" />}
        <JobArea form={form} name="notes" hint="Only the office reads these." />
      </Group>
    </div>
  )
}
