import { Toast as Radix } from 'radix-ui'
import { createContext, type ReactNode, useCallback, useContext, useMemo, useState } from 'react'

type ToastMessage = {
  id: number
  text: string
  kind: 'done' | 'stop'
  undo?: (() => void) | undefined
}
type Show = (text: string, options?: { kind?: 'done' | 'stop'; undo?: () => void }) => void

const ToastContext = createContext<Show>(() => undefined)

/** `useToast()('Booking moved', { undo })`: says what happened and, where it can be, takes it back. */
export function useToast(): Show {
  return useContext(ToastContext)
}

const shownMs = 8_000

export function ToastProvider({ children }: { children: ReactNode }) {
  const [messages, setMessages] = useState<ToastMessage[]>([])
  const show = useCallback<Show>((text, options = {}) => {
    setMessages((now) => [
      ...now.slice(-2),
      { id: Date.now() + Math.random(), text, kind: options.kind ?? 'done', undo: options.undo },
    ])
  }, [])
  const drop = (id: number) => setMessages((now) => now.filter((message) => message.id !== id))
  const value = useMemo(() => show, [show])
  return (
    <ToastContext.Provider value={value}>
      <Radix.Provider duration={shownMs}>
        {children}
        {messages.map((message) => (
          <Radix.Root
            key={message.id}
            onOpenChange={(open) => (open ? undefined : drop(message.id))}
            className={`flex items-center justify-between gap-4 rounded-md border border-l-8 bg-sheet p-3 shadow-float ${message.kind === 'stop' ? 'border-stop' : 'border-leaf'}`}
          >
            <Radix.Description className="font-semibold">{message.text}</Radix.Description>
            {message.undo ? (
              <Radix.Action altText="Undo" asChild>
                <button
                  type="button"
                  onClick={message.undo}
                  className="min-h-11 shrink-0 rounded-md px-3 font-semibold text-chalk underline"
                >
                  Undo
                </button>
              </Radix.Action>
            ) : null}
          </Radix.Root>
        ))}
        {/* At the desk on the left, clear of the panel that slides in on the right. */}
        <Radix.Viewport className="fixed bottom-20 right-4 z-50 flex w-[min(24rem,92vw)] flex-col gap-2 lg:bottom-4 lg:left-60 lg:right-auto print:hidden" />
      </Radix.Provider>
    </ToastContext.Provider>
  )
}
