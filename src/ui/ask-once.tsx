import { Button } from './button.tsx'
import { Dialog } from './dialog.tsx'
import { FormFailure } from './form-failure.tsx'

type Props = {
  open: boolean
  title: string
  /** What goes, by name. */
  text: string
  doWords: string
  keepWords: string
  busy: boolean
  error?: unknown
  onDo: () => void
  onClose: () => void
}

/** Before something goes that cannot be brought back. */
export function AskOnce({ open, title, text, doWords, keepWords, busy, error, ...on }: Props) {
  return (
    <Dialog open={open} onClose={on.onClose} title={title}>
      <p className="mb-4">{text}</p>
      <div className="flex flex-wrap gap-3">
        <Button kind="danger" busy={busy} onClick={on.onDo}>
          {doWords}
        </Button>
        <Button kind="plain" onClick={on.onClose}>
          {keepWords}
        </Button>
      </div>
      <div className="mt-3">
        <FormFailure error={error} />
      </div>
    </Dialog>
  )
}
