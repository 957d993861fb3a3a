import { useToast } from '../../ui/toast.tsx'

/**
 * Wraps an undo for a toast's button. It may be pressed after the screen that offered it has gone, so a
 * refusal is told in a toast of its own.
 */
export function useUndoing(): (undo: () => Promise<unknown>) => () => void {
  const toast = useToast()
  return (undo) => () => {
    undo().catch((error: unknown) => {
      const message = error instanceof Error ? error.message : 'That could not be taken back.'
      toast(message, { kind: 'stop' })
    })
  }
}
