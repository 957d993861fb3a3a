import { type ReactNode, useState } from 'react'
import { failureText } from '../../lib/failure-text.ts'
import { Button } from '../../ui/button.tsx'

export type Say = (text: string, undo: () => Promise<unknown>) => void

type Said = { text: string; undo: () => Promise<unknown>; state: 'said' | 'undoing' | 'failed' }

/** What was done, with the way back, inside the panel: a toast is out of reach of keys while a panel is open. */
export function useUndoLine(): { line: ReactNode; say: Say } {
  const [said, setSaid] = useState<Said | null>(null)
  const undo = async (done: Said) => {
    setSaid({ ...done, state: 'undoing' })
    try {
      await done.undo()
      setSaid(null)
    } catch (error) {
      setSaid({ ...done, text: failureText(error) ?? '', state: 'failed' })
    }
  }
  const line = said ? (
    <div
      role="status"
      className={`my-2 flex items-center justify-between gap-3 rounded-md border border-l-8 pl-3 ${said.state === 'failed' ? 'border-stop' : 'border-leaf'}`}
    >
      <span className="min-w-0 py-2 font-semibold [overflow-wrap:anywhere]">{said.text}</span>
      {said.state === 'failed' ? null : (
        <Button
          kind="quiet"
          autoFocus
          busy={said.state === 'undoing'}
          onClick={() => void undo(said)}
        >
          Undo
        </Button>
      )}
    </div>
  ) : null
  return { line, say: (text, back) => setSaid({ text, undo: back, state: 'said' }) }
}
