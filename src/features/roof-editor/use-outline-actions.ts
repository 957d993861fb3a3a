import { useEffect, useMemo, useRef } from 'react'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import { platesOfForm } from '../../../shared/revisions/form-outline.ts'
import type { Point2 } from '../../../shared/roof/roof-types.ts'
import { withCornerAt, withCornerOn, withoutCorner } from './outline-edits.ts'
import { useRoofForm } from './roof-form-context.ts'

export type OutlineActions = {
  /** One step of undo a drag. */
  drop: (corner: number, at: Point2) => void
  /** Keys within a moment are one step. */
  nudge: (corner: number, byMm: Point2) => void
  takeOut: (corner: number) => boolean
  addOn: (edge: number) => boolean
}

/** Changes of the outline; always of the form as it stands, whatever the drawing still shows. */
export function useOutlineActions(): OutlineActions {
  const { form, setForm } = useRoofForm()
  const now = useRef(form)
  const drags = useRef(0)
  useEffect(() => {
    now.current = form
  }, [form])
  return useMemo(() => {
    const take = (next: RoofForm | null, what: string): boolean => {
      if (!next) return false
      now.current = next
      setForm(next, what)
      return true
    }
    return {
      drop(corner, at) {
        drags.current += 1
        take(withCornerAt(now.current, corner, at), `drag.${drags.current}`)
      },
      nudge(corner, byMm) {
        const from = platesOfForm(now.current)[corner]?.start
        if (!from) return
        const to = { x: from.x + byMm.x, y: from.y + byMm.y }
        take(withCornerAt(now.current, corner, to), `nudge.${corner}`)
      },
      takeOut: (corner) => take(withoutCorner(now.current, corner), `out.${corner}`),
      addOn: (edge) => take(withCornerOn(now.current, edge), `add.${edge}`),
    }
  }, [setForm])
}
