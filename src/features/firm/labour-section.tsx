import type { ReactNode } from 'react'
import type { FirmSettings } from '../../../shared/firm/firm-schemas.ts'
import { defaultLabourRates as standard } from '../../../shared/labour/default-labour-rates.ts'
import {
  type LabourSource,
  labourSourceNotes,
  pieceSource,
} from '../../../shared/labour/labour-sources.ts'
import { packagesInWords } from '../../../shared/labour/package-words.ts'
import { packageKeys } from '../../../shared/labour/work-step.ts'
import { roleWords } from '../../../shared/marking/role-words.ts'
import type { MemberRole } from '../../../shared/roof/roof-types.ts'
import { Card } from '../../ui/card.tsx'
import { Fold } from '../../ui/fold.tsx'
import { gridClass, labourFields } from './firm-fields.ts'
import { LabourNumber } from './labour-number.tsx'

type Rates = FirmSettings['labourRates']
type Props = {
  rates: Rates
  onChange: (rates: Rates) => void
  issueAt: (path: string) => string | undefined
}

const rolesWith = (source: LabourSource) =>
  (Object.keys(roleWords) as MemberRole[]).filter((role) => pieceSource(role) === source)

type GroupProps = { title: string; note: string; isOpen: boolean; children: ReactNode }

/** Put away until asked for; a fault in it opens it. */
function Group({ title, note, isOpen, children }: GroupProps) {
  return (
    <Fold title={title} isOpen={isOpen}>
      <p className="mb-3 max-w-prose text-sm text-ink-soft">{note}</p>
      {children}
      <div className="h-4" />
    </Fold>
  )
}

function Pieces({ rates, onChange, issueAt, roles }: Props & { roles: MemberRole[] }) {
  const kinds = [
    ['cutMinutes', 'Cut'],
    ['standMinutes', 'Stand'],
  ] as const
  return (
    <div className="grid gap-x-6 gap-y-4 sm:grid-cols-2 xl:grid-cols-3">
      {roles.map((role) => (
        <fieldset key={role} className="grid grid-cols-2 items-start gap-2">
          <legend className="mb-1 font-extrabold">{roleWords[role]}</legend>
          {kinds.map(([key, label]) => (
            <LabourNumber
              key={key}
              label={label}
              of={roleWords[role]}
              value={rates.pieces[role][key]}
              standard={standard.pieces[role][key]}
              source={pieceSource(role)}
              onChange={(value) =>
                onChange({
                  ...rates,
                  pieces: { ...rates.pieces, [role]: { ...rates.pieces[role], [key]: value } },
                })
              }
              error={issueAt(`labourRates.pieces.${role}.${key}`)}
            />
          ))}
        </fieldset>
      ))}
    </div>
  )
}

function Packages({ rates, onChange, issueAt }: Props) {
  return (
    <div className={gridClass}>
      <LabourNumber
        label="Each person, each day’s start"
        value={rates.startUpMinutes}
        standard={standard.startUpMinutes}
        source="none-added"
        onChange={(startUpMinutes) => onChange({ ...rates, startUpMinutes })}
        error={issueAt('labourRates.startUpMinutes')}
      />
      {packageKeys.map((key) => (
        <LabourNumber
          key={key}
          label={`Set up for ${packagesInWords([key]).toLowerCase()}`}
          value={rates.packageMinutes[key]}
          standard={standard.packageMinutes[key]}
          source="none-added"
          onChange={(value) =>
            onChange({ ...rates, packageMinutes: { ...rates.packageMinutes, [key]: value } })
          }
          error={issueAt(`labourRates.packageMinutes.${key}`)}
        />
      ))}
    </div>
  )
}

function OtherWork({ rates, onChange, issueAt }: Props) {
  return (
    <div className={gridClass}>
      {labourFields.map(({ key, label }) => (
        <LabourNumber
          key={key}
          label={label}
          value={rates[key]}
          standard={standard[key]}
          source="practice"
          onChange={(value) => onChange({ ...rates, [key]: value })}
          error={issueAt(`labourRates.${key}`)}
        />
      ))}
    </div>
  )
}

/** Minutes of one person; where the first figures come from stands with them. */
export function LabourSection(props: Props) {
  const hasFault = (path: string) => props.issueAt(`labourRates.${path}`) !== undefined
  const hasPieceFault = (source: LabourSource) =>
    rolesWith(source).some((role) =>
      ['cutMinutes', 'standMinutes'].some((key) => hasFault(`pieces.${role}.${key}`)),
    )
  return (
    <Card>
      <h2 className="text-lg font-extrabold">Labour</h2>
      <p className="max-w-prose text-ink-soft">
        Minutes of one person. A job’s hours, planned and logged, show how near they are.
      </p>
      <div className="divide-y divide-rule">
        <Group
          title="Rafters and lines, each piece"
          note={labourSourceNotes.textbook}
          isOpen={hasPieceFault('textbook')}
        >
          <Pieces {...props} roles={rolesWith('textbook')} />
        </Group>
        <Group
          title="Purlins, ties and trim, each piece"
          note={labourSourceNotes.practice}
          isOpen={hasPieceFault('practice')}
        >
          <Pieces {...props} roles={rolesWith('practice')} />
        </Group>
        <Group
          title="Setting out, trying, bracing"
          note={labourSourceNotes.practice}
          isOpen={labourFields.some(({ key }) => hasFault(key))}
        >
          <OtherWork {...props} />
        </Group>
        <Group
          title="Set-ups and the start of a day"
          note={labourSourceNotes['none-added']}
          isOpen={
            hasFault('startUpMinutes') ||
            packageKeys.some((key) => hasFault(`packageMinutes.${key}`))
          }
        >
          <Packages {...props} />
        </Group>
      </div>
    </Card>
  )
}
