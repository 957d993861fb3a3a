import type { OutlineFault } from './outline-faults.ts'

/** What is wrong in words; numbers as on the drawing. */
export function FaultList({ faults }: { faults: readonly OutlineFault[] }) {
  if (faults.length === 0) return null
  return (
    <ul className="space-y-1" aria-label="What to put right">
      {faults.map(({ message, number }) => (
        <li key={message} className="flex items-start gap-2 font-semibold text-stop">
          {number === null ? null : (
            <span className="mt-0.5 flex h-5 min-w-5 shrink-0 items-center justify-center rounded-full bg-stop px-1 text-sm font-extrabold text-on-fill tabular-nums">
              {number}
            </span>
          )}
          {message}
        </li>
      ))}
    </ul>
  )
}
