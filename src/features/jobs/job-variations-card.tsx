import { useQuery } from '@tanstack/react-query'
import { Plus } from 'lucide-react'
import { useState } from 'react'
import { formatPrice } from '../../../shared/jobs/price-text.ts'
import { variationTotals } from '../../../shared/variations/variation-rules.ts'
import type { JobVariations } from '../../../shared/variations/variation-schemas.ts'
import { newDeviceId } from '../../lib/device-id.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useMay } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { VariationForm } from './variation-form.tsx'
import { useAddVariation, variationQueries } from './variation-queries.ts'
import { VariationRow } from './variation-row.tsx'

function Totals({ priceCents, variations }: JobVariations) {
  const { agreedCents, openCents, wholeCents } = variationTotals(priceCents, variations)
  const lines: [string, number | null][] = [
    ['Agreed on top of the price', agreedCents],
    ['Waiting for a yes', openCents === 0 ? null : openCents],
    ['Price with what is agreed', wholeCents],
  ]
  return (
    <dl className="mt-2 border-t-2 border-rule pt-2">
      {lines.map(([label, cents]) =>
        cents === null ? null : (
          <div key={label} className="flex justify-between gap-3">
            <dt>{label}</dt>
            <dd className="font-semibold tabular-nums">{formatPrice(cents)}</dd>
          </div>
        ),
      )}
    </dl>
  )
}

function AddVariation({ jobId }: { jobId: string }) {
  const [id, setId] = useState<string | null>(null)
  const add = useAddVariation(jobId)
  const close = () => {
    setId(null)
    add.reset()
  }
  if (id === null)
    return (
      <Button kind="plain" className="mt-3" onClick={() => setId(newDeviceId())}>
        <Plus size={18} aria-hidden />
        Add a variation
      </Button>
    )
  return (
    <VariationForm
      start={{ reason: '', price: '' }}
      save="Add it"
      error={add.error}
      busy={add.isPending}
      onBack={close}
      onSave={(values) => add.mutate({ ...values, id }, { onSuccess: close })}
    />
  )
}

/** Work beyond the price, for whoever may see prices: why, how much, and the builder's yes. */
export function JobVariationsCard({ jobId }: { jobId: string }) {
  const mayRead = useMay('price:read')
  const mayWrite = useMay('variation:write')
  const query = useQuery({ ...variationQueries.ofJob(jobId), enabled: mayRead })
  const { data, error } = query
  if (!mayRead) return null
  return (
    <Card aria-labelledby="job-variations">
      <h2 id="job-variations" className="text-lg font-extrabold">
        Variations
      </h2>
      {!data && error ? (
        <ErrorState
          message={failureText(error) ?? 'The variations could not be loaded.'}
          onRetry={() => void query.refetch()}
        />
      ) : !data ? (
        <Skeleton className="h-16" />
      ) : data.variations.length === 0 ? (
        <p className="text-ink-soft">None. Work beyond the price is asked for and agreed here.</p>
      ) : (
        <>
          <ul className="divide-y divide-rule">
            {data.variations.map((variation) => (
              <VariationRow key={variation.id} jobId={jobId} variation={variation} />
            ))}
          </ul>
          <Totals {...data} />
        </>
      )}
      {data && mayWrite ? <AddVariation jobId={jobId} /> : null}
    </Card>
  )
}
