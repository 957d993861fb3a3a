import type { FirmSettings } from '../../../shared/firm/firm-schemas.ts'
import { roleWords } from '../../../shared/marking/role-words.ts'
import type { MemberRole } from '../../../shared/roof/roof-types.ts'
import { Card } from '../../ui/card.tsx'
import { labourFields } from './firm-fields.ts'
import { NumberInput } from './number-input.tsx'

type Rates = FirmSettings['labourRates']
type Props = {
  rates: Rates
  onChange: (rates: Rates) => void
  issueAt: (path: string) => string | undefined
}

/** Minutes a piece; where the first figures come from stands with them. */
export function LabourSection({ rates, onChange, issueAt }: Props) {
  const setPiece = (role: MemberRole, key: 'cutMinutes' | 'standMinutes') => (value: number) =>
    onChange({
      ...rates,
      pieces: { ...rates.pieces, [role]: { ...rates.pieces[role], [key]: value } },
    })
  return (
    <Card>
      <h2 className="text-lg font-extrabold">Labour</h2>
      <p className="mb-3 max-w-prose text-ink-soft">
        Minutes of one person for one piece. The first figures are common practice, no source;
        correct them from your own days.
      </p>
      <div className="grid gap-x-6 gap-y-3 sm:grid-cols-2 xl:grid-cols-3">
        {(Object.keys(roleWords) as MemberRole[]).map((role) => (
          <fieldset key={role} className="grid grid-cols-2 gap-2">
            <legend className="mb-1 font-extrabold">{roleWords[role]}</legend>
            <NumberInput
              label="Cut"
              unit="min"
              value={rates.pieces[role].cutMinutes}
              onChange={setPiece(role, 'cutMinutes')}
              error={issueAt(`labourRates.pieces.${role}.cutMinutes`)}
            />
            <NumberInput
              label="Stand"
              unit="min"
              value={rates.pieces[role].standMinutes}
              onChange={setPiece(role, 'standMinutes')}
              error={issueAt(`labourRates.pieces.${role}.standMinutes`)}
            />
          </fieldset>
        ))}
      </div>
      <div className="mt-4 grid gap-3 sm:grid-cols-2 xl:grid-cols-3">
        {labourFields.map(({ key, ...field }) => (
          <NumberInput
            key={key}
            {...field}
            value={rates[key]}
            onChange={(value) => onChange({ ...rates, [key]: value })}
            error={issueAt(`labourRates.${key}`)}
          />
        ))}
      </div>
    </Card>
  )
}
