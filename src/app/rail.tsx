import { Keyboard } from 'lucide-react'
import { NavLink } from 'react-router-dom'
import { roleNames } from '../../shared/auth/roles.ts'
import type { SessionUser } from '../lib/session.ts'
import type { NavigationEntry } from './navigation.ts'

type Props = { entries: NavigationEntry[]; user: SessionUser; firmName: string; onKeys: () => void }

const linkClass = ({ isActive }: { isActive: boolean }) =>
  `flex min-h-11 items-center gap-3 rounded-md px-3 font-semibold ${
    isActive ? 'bg-paper text-clay' : 'text-ink hover:bg-paper'
  }`

/** Navigation at the desk. */
export function Rail({ entries, user, firmName, onKeys }: Props) {
  return (
    <aside className="fixed inset-y-0 left-0 z-20 hidden w-56 flex-col border-r border-rule bg-sheet lg:flex print:hidden">
      <div className="px-4 pb-4 pt-5">
        <img src="/ridgehand.svg" alt="" className="h-9 w-9" />
        <p className="mt-2 text-lg font-extrabold leading-tight">Ridgehand</p>
        <p className="text-sm text-ink-soft">{firmName}</p>
      </div>
      <nav aria-label="Main" className="flex-1 space-y-1 px-2">
        {entries.map(({ to, label, icon: Icon }) => (
          <NavLink key={to} to={to} className={linkClass}>
            <Icon size={20} aria-hidden />
            {label}
          </NavLink>
        ))}
      </nav>
      <div className="border-t border-rule p-2">
        <button
          type="button"
          aria-keyshortcuts="?"
          onClick={onKeys}
          className="flex min-h-11 w-full items-center gap-3 rounded-md px-3 font-semibold text-ink-soft hover:bg-paper"
        >
          <Keyboard size={20} aria-hidden />
          Keys
          <kbd className="ml-auto rounded-sm border border-ink-soft px-1.5 font-sans text-sm">
            ?
          </kbd>
        </button>
        <NavLink to="/account" className={linkClass}>
          <span className="min-w-0">
            <span className="block truncate">{user.name}</span>
            <span className="block text-sm font-normal text-ink-soft">{roleNames[user.role]}</span>
          </span>
        </NavLink>
      </div>
    </aside>
  )
}
