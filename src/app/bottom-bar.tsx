import { Menu } from 'lucide-react'
import { DropdownMenu } from 'radix-ui'
import { Link, NavLink } from 'react-router-dom'
import type { SessionUser } from '../lib/session.ts'
import type { NavigationEntry } from './navigation.ts'

const itemClass =
  'flex min-h-14 flex-1 flex-col items-center justify-center gap-0.5 text-sm font-semibold'

/** Navigation under the thumb: three places and *More*. */
export function BottomBar({ entries, user }: { entries: NavigationEntry[]; user: SessionUser }) {
  const first = entries.slice(0, 3)
  const rest = entries.slice(3)
  return (
    <nav
      aria-label="Main"
      className="fixed inset-x-0 bottom-0 z-20 flex border-t border-rule bg-sheet pb-[env(safe-area-inset-bottom)] lg:hidden print:hidden"
    >
      {first.map(({ to, label, icon: Icon }) => (
        <NavLink
          key={to}
          to={to}
          className={({ isActive }) => `${itemClass} ${isActive ? 'text-clay' : 'text-ink'}`}
        >
          <Icon size={22} aria-hidden />
          {label}
        </NavLink>
      ))}
      <DropdownMenu.Root>
        <DropdownMenu.Trigger className={itemClass}>
          <Menu size={22} aria-hidden />
          More
        </DropdownMenu.Trigger>
        <DropdownMenu.Portal>
          <DropdownMenu.Content
            side="top"
            align="end"
            sideOffset={8}
            className="z-30 min-w-56 rounded-md border border-rule bg-sheet p-1 shadow-float"
          >
            {rest.map(({ to, label, icon: Icon }) => (
              <DropdownMenu.Item key={to} asChild>
                <Link
                  to={to}
                  className="flex min-h-14 items-center gap-3 rounded-sm px-3 font-semibold data-highlighted:bg-paper"
                >
                  <Icon size={20} aria-hidden />
                  {label}
                </Link>
              </DropdownMenu.Item>
            ))}
            <DropdownMenu.Item asChild>
              <Link
                to="/account"
                className="flex min-h-14 items-center rounded-sm px-3 font-semibold data-highlighted:bg-paper"
              >
                {user.name}
              </Link>
            </DropdownMenu.Item>
          </DropdownMenu.Content>
        </DropdownMenu.Portal>
      </DropdownMenu.Root>
    </nav>
  )
}
