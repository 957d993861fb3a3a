import { useQuery } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import type { FirmSettings } from '../../../shared/firm/firm-schemas.ts'
import { failureText, issueAt as issueOf } from '../../lib/failure-text.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { useToast } from '../../ui/toast.tsx'
import { firmQuery, useSaveFirm } from './firm-queries.ts'
import { FirmSections } from './firm-sections.tsx'
import { LabourSection } from './labour-section.tsx'

function FirmForm({ saved }: { saved: FirmSettings }) {
  const [firm, setFirm] = useState(saved)
  const save = useSaveFirm()
  const toast = useToast()
  const formRef = useFaultFocus(save.error)
  const issueAt = (path: string) => issueOf(save.error, path)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (save.isPending) return
    save.mutate(firm, {
      onSuccess: (now) => {
        setFirm(now)
        toast('Settings saved.')
      },
    })
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-4">
      <FirmSections firm={firm} onChange={setFirm} issueAt={issueAt} />
      <LabourSection
        rates={firm.labourRates}
        onChange={(labourRates) => setFirm((now) => ({ ...now, labourRates }))}
        issueAt={issueAt}
      />
      <div className="sticky bottom-16 flex flex-wrap items-center gap-4 rounded-md border border-rule bg-sheet p-3 lg:bottom-0">
        <Button type="submit" busy={save.isPending}>
          Save settings
        </Button>
        {save.error ? (
          <p role="alert" className="font-semibold text-stop">
            {failureText(save.error)}
          </p>
        ) : null}
      </div>
    </form>
  )
}

/** What the firm sets once: days, hours, reminders, saw, timber, labour. */
export function FirmPage() {
  const firm = useQuery(firmQuery)
  if (firm.error)
    return (
      <ErrorState message={failureText(firm.error) ?? ''} onRetry={() => void firm.refetch()} />
    )
  if (!firm.data) return <PageSkeleton />
  return (
    <>
      <PageHeader title="Firm" lead="Plans of days not yet started follow these settings." />
      <FirmForm saved={firm.data} />
    </>
  )
}
