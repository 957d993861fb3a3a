import { Check } from 'lucide-react'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'

type Step = { to: string; link: string; why: ReactNode; isDone: boolean }

/** What a firm that has just begun does first, in order. */
export function FirstSteps({ hasCrews }: { hasCrews: boolean }) {
  const steps: Step[] = [
    {
      to: '/firm',
      link: 'Look over the firm’s settings',
      why: 'Name, days worked, start, and when reminders go.',
      isDone: false,
    },
    {
      to: '/people',
      link: 'Add your crews and people',
      why: 'A crew first, then who is in it. Each person gets a link to sign in.',
      isDone: hasCrews,
    },
    {
      to: '/jobs/new',
      link: 'Write down the first job',
      why: 'Its roof, its price and its days come after.',
      isDone: false,
    },
  ]
  return (
    <section className="max-w-xl rounded-md border border-rule bg-sheet p-4 sm:p-6">
      <h2 className="text-lg font-extrabold">No jobs yet. Where to begin</h2>
      <ol className="mt-2 divide-y divide-rule">
        {steps.map(({ to, link, why, isDone }, i) => (
          <li key={to} className="flex gap-3 py-3">
            <span
              aria-hidden
              className="flex h-8 w-8 shrink-0 items-center justify-center rounded-full border-2 border-ink font-extrabold"
            >
              {isDone ? <Check size={18} className="text-leaf" /> : i + 1}
            </span>
            <span>
              <Link to={to} className="inline-block py-1 font-semibold text-chalk underline">
                {link}
              </Link>
              {isDone ? <span className="ml-2 text-sm font-semibold text-leaf">Done</span> : null}
              <span className="block text-ink-soft">{why}</span>
            </span>
          </li>
        ))}
      </ol>
    </section>
  )
}
