import { createContext, useContext } from 'react'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'

export type RoofFormHandle = {
  form: RoofForm
  /** What to show at a field; undefined where all is well. */
  problemAt: (path: string) => string | undefined
  /** What would answer a caution, at the field where it could be typed. */
  hintAt: (path: string) => string | undefined
  setText: (path: string, text: string) => void
  /** A change of more than one text; `what` names the step for undo. */
  setForm: (form: RoofForm, what: string) => void
}

export const RoofFormContext = createContext<RoofFormHandle | null>(null)

export function useRoofForm(): RoofFormHandle {
  const handle = useContext(RoofFormContext)
  if (!handle) throw new Error('Only within the roof editor.')
  return handle
}

/** Where a problem's link leads. */
export function fieldId(path: string): string {
  return `roof-${path.replaceAll('.', '-')}`
}
