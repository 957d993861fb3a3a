import { useState } from 'react'
import { formatPrice, priceInputText } from '../../../shared/jobs/price-text.ts'
import {
  type VariationState,
  variationState,
  variationStateNames,
} from '../../../shared/variations/variation-rules.ts'
import type { Variation } from '../../../shared/variations/variation-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { Badge } from '../../ui/badge.tsx'
import { Button } from '../../ui/button.tsx'
import { useToast } from '../../ui/toast.tsx'
import { dayText } from './day-words.ts'
import { VariationForm, VariationYesForm } from './variation-form.tsx'
import { useChangeVariation, type VariationChange } from './variation-queries.ts'

const badgeKinds: Record<VariationState, 'plain' | 'ochre' | 'chalk' | 'leaf'> = {
  'not-priced': 'ochre',
  'to-ask': 'ochre',
  asked: 'chalk',
  agreed: 'leaf',
  withdrawn: 'plain',
}

function priceInput(cents: number | null): string {
  return cents !== null && cents < 0 ? `-${priceInputText(-cents)}` : priceInputText(cents)
}

type Fields = Omit<VariationChange, 'id' | 'version'>

/** A change said in a toast, taken back by Undo while nobody has changed it again. */
function useVariation(jobId: string, variation: Variation) {
  const change = useChangeVariation(jobId)
  const toast = useToast()
  const stop = (error: unknown) =>
    toast(failureText(error) ?? 'That was not saved. Try again.', { kind: 'stop' })
  const send = (fields: Fields, said: string, back: Fields, onSaved?: () => void) => {
    if (change.isPending) return
    const { id, version } = variation
    change.mutate(
      { ...fields, id, version },
      {
        onSuccess: ({ variations }) => {
          onSaved?.()
          const after = variations.find((one) => one.id === id)
          if (!after || after.version === version) return
          toast(said, {
            undo: () => change.mutate({ ...back, id, version: after.version }, { onError: stop }),
          })
        },
        onError: (error) => {
          if (!onSaved) stop(error)
        },
      },
    )
  }
  return { send, error: change.error, busy: change.isPending, reset: change.reset }
}

function stateWords(variation: Variation, today: string): string {
  const { agreedOn, agreedBy, askedOn, withdrawnOn } = variation
  if (withdrawnOn) return `since ${dayText(withdrawnOn, today)}`
  if (agreedOn) return `${agreedBy}, ${dayText(agreedOn, today)}`
  return askedOn ? dayText(askedOn, today) : ''
}

type ActionProps = {
  variation: Variation
  state: VariationState
  today: string
  busy: boolean
  send: ReturnType<typeof useVariation>['send']
  onOpen: (what: 'edit' | 'yes') => void
}

/** What can come next, by where it stands. */
function VariationActions({ variation, state, today, busy, send, onOpen }: ActionProps) {
  const name = `V${variation.sequence}`
  const { agreedOn, agreedBy } = variation
  const wasAgreed = agreedOn ? { on: agreedOn, by: agreedBy } : null
  return (
    <div className="-ml-4 mt-1 flex flex-wrap gap-x-1">
      {state === 'to-ask' ? (
        <Button
          kind="quiet"
          busy={busy}
          onClick={() => send({ askedOn: today }, `${name} asked for.`, { askedOn: null })}
        >
          Asked today
        </Button>
      ) : null}
      {state === 'to-ask' || state === 'asked' ? (
        <Button kind="quiet" onClick={() => onOpen('yes')}>
          Builder said yes
        </Button>
      ) : null}
      {state === 'agreed' ? (
        <Button
          kind="quiet"
          busy={busy}
          onClick={() => send({ agreed: null }, 'The yes is taken back.', { agreed: wasAgreed })}
        >
          Take the yes back
        </Button>
      ) : null}
      {state === 'agreed' || state === 'withdrawn' ? null : (
        <Button kind="quiet" onClick={() => onOpen('edit')}>
          Edit
        </Button>
      )}
      {state === 'withdrawn' ? (
        <Button
          kind="quiet"
          busy={busy}
          onClick={() =>
            send({ withdrawnOn: null }, `${name} is back.`, {
              withdrawnOn: variation.withdrawnOn,
            })
          }
        >
          Bring it back
        </Button>
      ) : state === 'agreed' ? null : (
        <Button
          kind="quiet"
          busy={busy}
          onClick={() => send({ withdrawnOn: today }, `${name} withdrawn.`, { withdrawnOn: null })}
        >
          Withdraw
        </Button>
      )}
    </div>
  )
}

/** One variation: what, how much, how far it is, and what comes next. */
export function VariationRow({ jobId, variation }: { jobId: string; variation: Variation }) {
  const { today } = useSession().firm
  const [open, setOpen] = useState<'edit' | 'yes' | null>(null)
  const { send, error, busy, reset } = useVariation(jobId, variation)
  const state = variationState(variation)
  const name = `V${variation.sequence}`
  const close = () => {
    setOpen(null)
    reset()
  }
  const { reason, priceCents } = variation
  return (
    <li className="py-3">
      <div className="flex items-start justify-between gap-3">
        <p className="min-w-0 [overflow-wrap:anywhere]">
          <span className="font-extrabold">{name}</span>{' '}
          <span className="whitespace-pre-line">{reason}</span>
        </p>
        <p className="shrink-0 text-right font-semibold tabular-nums">
          {priceCents === null ? '–' : formatPrice(priceCents)}
        </p>
      </div>
      <p className="mt-1 flex flex-wrap items-center gap-2 text-sm">
        <Badge kind={badgeKinds[state]}>{variationStateNames[state]}</Badge>
        <span>{stateWords(variation, today)}</span>
      </p>
      {open === 'edit' ? (
        <VariationForm
          start={{ reason, price: priceInput(priceCents) }}
          save="Save"
          error={error}
          busy={busy}
          onBack={close}
          onSave={(values) =>
            send(values, `${name} saved.`, { reason, price: priceInput(priceCents) }, close)
          }
        />
      ) : open === 'yes' ? (
        <VariationYesForm
          today={today}
          error={error}
          busy={busy}
          onBack={close}
          onSave={(agreed) => send({ agreed }, `${name} agreed.`, { agreed: null }, close)}
        />
      ) : (
        <VariationActions
          variation={variation}
          state={state}
          today={today}
          busy={busy}
          send={send}
          onOpen={setOpen}
        />
      )}
    </li>
  )
}
