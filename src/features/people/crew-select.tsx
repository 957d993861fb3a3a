import type { ComponentProps } from 'react'
import type { Crew } from '../../../shared/people/people-schemas.ts'
import { Select } from '../../ui/inputs.tsx'

type Props = Omit<ComponentProps<'select'>, 'onChange' | 'value'> & {
  crews: Crew[]
  value: string
  onChange: (crewId: string) => void
}

export function CrewSelect({ crews, value, onChange, ...rest }: Props) {
  return (
    <Select {...rest} value={value} onChange={(event) => onChange(event.target.value)}>
      <option value="">No crew</option>
      {crews
        .filter((crew) => crew.active || crew.id === value)
        .map((crew) => (
          <option key={crew.id} value={crew.id}>
            {crew.name}
          </option>
        ))}
    </Select>
  )
}
