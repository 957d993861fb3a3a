type Option<Value extends string> = { value: Value; label: string }

type Props<Value extends string> = {
  label: string
  options: readonly Option<Value>[]
  value: Value
  onChange: (value: Value) => void
  /** Four words beside one another on a phone. */
  dense?: boolean
}

/** A few choices side by side, one taken. */
export function Segmented<Value extends string>({
  label,
  options,
  value,
  onChange,
  dense,
}: Props<Value>) {
  return (
    <div
      role="radiogroup"
      aria-label={label}
      className="inline-flex flex-wrap rounded-md border border-ink-soft bg-sheet"
    >
      {options.map((option) => (
        <label
          key={option.value}
          className={`flex min-h-11 items-center rounded-md ${dense ? 'px-2' : 'px-3'} font-semibold has-focus-visible:outline-3 has-focus-visible:outline-chalk ${option.value === value ? 'bg-ink text-sheet' : 'text-ink'}`}
        >
          <input
            type="radio"
            className="sr-only"
            name={label}
            value={option.value}
            checked={option.value === value}
            onChange={() => onChange(option.value)}
          />
          {option.label}
        </label>
      ))}
    </div>
  )
}
