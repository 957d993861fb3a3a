import { Search } from 'lucide-react'
import { useId } from 'react'
import { useSearchKey } from '../lib/use-search-key.ts'
import { TextInput } from './inputs.tsx'

type Props = {
  label: string
  placeholder?: string
  maxLength: number
  value: string
  onChange: (value: string) => void
  className?: string
}

/** The search of a page; `/` leads to it from anywhere. */
export function SearchBox({
  label,
  placeholder,
  maxLength,
  value,
  onChange,
  className = '',
}: Props) {
  const id = useId()
  const input = useSearchKey()
  return (
    <div className={`relative ${className}`}>
      <label htmlFor={id} className="mb-1 block font-semibold">
        {label}
      </label>
      <Search size={18} aria-hidden className="absolute bottom-3.5 left-3 text-ink-soft" />
      <TextInput
        ref={input}
        id={id}
        type="search"
        className="pl-9"
        placeholder={placeholder}
        aria-keyshortcuts="/"
        maxLength={maxLength}
        value={value}
        onChange={(event) => onChange(event.target.value)}
      />
    </div>
  )
}
