import { Sun } from 'lucide-react'
import { setPreference, usePreference } from '../lib/preferences.ts'

/** Black on white and larger numerals, for a phone in the sun. */
export function SunlightSwitch() {
  const isOn = usePreference('sunlight') === 'on'
  return (
    <button
      type="button"
      role="switch"
      aria-checked={isOn}
      onClick={() => setPreference('sunlight', isOn ? '' : 'on')}
      className={`inline-flex min-h-14 items-center gap-2 rounded-md border px-4 text-lg font-semibold print:hidden ${isOn ? 'border-ink bg-ink text-sheet' : 'border-ink-soft bg-sheet'}`}
    >
      <Sun size={22} aria-hidden />
      Sunlight
    </button>
  )
}
