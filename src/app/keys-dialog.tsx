import type { Role } from '../../shared/auth/roles.ts'
import { Dialog } from '../ui/dialog.tsx'

type Key = { keys: string[]; does: string }
type Group = { title: string; keys: Key[]; roles?: Role[] }

/** Only what really listens. */
const groups: Group[] = [
  {
    title: 'Everywhere',
    keys: [
      { keys: ['?'], does: 'Show these keys' },
      { keys: ['/'], does: 'Go to the search of the page' },
      { keys: ['Esc'], does: 'Close what is open' },
      { keys: ['Enter'], does: 'Save the form, or open what is picked' },
      { keys: ['Tab'], does: 'On to the next control; with Shift, back' },
    ],
  },
  {
    title: 'On the calendar',
    roles: ['office'],
    keys: [
      { keys: ['Ctrl', 'Z'], does: 'Take the last change of a booking back' },
      { keys: ['Ctrl', 'Shift', 'Z'], does: 'Do it again' },
    ],
  },
  {
    title: 'On crew weeks',
    roles: ['office'],
    keys: [
      { keys: ['↑', '↓', '←', '→'], does: 'To the next booking, or crew' },
      { keys: ['Space'], does: 'Take the booking in hand; arrows carry it, Space puts it down' },
      { keys: ['Shift', '→'], does: 'A day longer; with the left arrow a day shorter' },
      { keys: ['Enter'], does: 'Show what can be done with it' },
    ],
  },
  {
    title: 'Entering a roof',
    roles: ['office'],
    keys: [
      { keys: ['Ctrl', 'Z'], does: 'Undo' },
      { keys: ['Ctrl', 'Shift', 'Z'], does: 'Redo' },
    ],
  },
  {
    title: 'On the outline of a roof',
    roles: ['office'],
    keys: [
      { keys: ['↑', '↓', '←', '→'], does: 'Move the corner by 100 mm' },
      { keys: ['Shift', '↑'], does: 'By 10 mm' },
      { keys: ['Ctrl', '↑'], does: 'By 1 mm' },
      { keys: ['Enter'], does: 'Open the edge or corner' },
      { keys: ['Insert'], does: 'Put a corner on the edge' },
      { keys: ['Delete'], does: 'Take out the corner' },
    ],
  },
  {
    title: 'On a roof plan',
    keys: [
      { keys: ['←', '→'], does: 'To the timber before or after' },
      { keys: ['Enter'], does: 'Open its marking card' },
    ],
  },
]

function Keys({ keys }: { keys: string[] }) {
  return (
    <span className="flex shrink-0 gap-1">
      {keys.map((key) => (
        <kbd
          key={key}
          className="min-w-8 rounded-sm border border-ink-soft bg-paper px-1.5 py-0.5 text-center font-sans text-sm font-semibold"
        >
          {key}
        </kbd>
      ))}
    </span>
  )
}

/** The keys that work, by where they work. */
export function KeysDialog(props: { role: Role; open: boolean; onClose: () => void }) {
  const { role, open, onClose } = props
  return (
    <Dialog open={open} onClose={onClose} title="Keys">
      <div className="space-y-5">
        {groups
          .filter(({ roles }) => !roles || roles.includes(role))
          .map(({ title, keys }) => (
            <section key={title}>
              <h3 className="font-extrabold">{title}</h3>
              <dl className="divide-y divide-rule">
                {keys.map((each) => (
                  <div key={each.does} className="flex items-center gap-4 py-2">
                    <dt className="w-36 shrink-0">
                      <Keys keys={each.keys} />
                    </dt>
                    <dd>{each.does}</dd>
                  </div>
                ))}
              </dl>
            </section>
          ))}
      </div>
    </Dialog>
  )
}
