import { useEffect, useRef } from 'react'
import { flushSync } from 'react-dom'
import type { FormProblem } from '../../../shared/revisions/form-typing.ts'
import { fieldId } from './roof-form-context.ts'

/** Moves to a field and puts the cursor in it. */
function goToField(path: string): void {
  const place = document.getElementById(fieldId(path))
  const fold = place?.closest('details')
  if (fold) fold.open = true
  place?.scrollIntoView({ block: 'center' })
  place?.querySelector<HTMLElement>('input, select, button')?.focus()
}

type Props = { problems: Pick<FormProblem, 'path' | 'message'>[]; onGo: () => void }

/** Why the roof cannot be issued; each leads to its field. */
export function ProblemList({ problems, onGo }: Props) {
  const box = useRef<HTMLDivElement>(null)
  useEffect(() => box.current?.focus(), [])
  return (
    <div
      ref={box}
      tabIndex={-1}
      role="alert"
      className="mb-4 rounded-md border-2 border-stop bg-sheet p-4"
    >
      <h2 className="font-extrabold text-stop">Not issued: put these right first</h2>
      <ul className="mt-1 gap-x-8 sm:columns-2 xl:columns-3">
        {problems.map(({ path, message }) => (
          <li key={path}>
            <a
              href={`#${fieldId(path)}`}
              className="inline-block py-1 font-semibold text-chalk underline"
              onClick={(event) => {
                event.preventDefault()
                // The field may be on a part of the page that shows only now.
                flushSync(onGo)
                goToField(path)
              }}
            >
              {message}
            </a>
          </li>
        ))}
      </ul>
    </div>
  )
}
