import { Suspense } from 'react'
import { Navigate, Outlet, useLocation, useNavigation } from 'react-router-dom'
import { useLiveEvents } from '../lib/live-events.ts'
import { useSession, type SessionUser } from '../lib/session.ts'
import { PageSkeleton } from '../ui/skeleton.tsx'
import { BottomBar } from './bottom-bar.tsx'
import { KeysDialog } from './keys-dialog.tsx'
import { navigationOf } from './navigation.ts'
import { Rail } from './rail.tsx'
import { useKeysHelp } from './use-keys-help.ts'

function SignedInShell({ user }: { user: SessionUser }) {
  useLiveEvents()
  const { firm } = useSession()
  const entries = navigationOf[user.role]
  const keys = useKeysHelp()
  const loading = useNavigation().state === 'loading'
  return (
    <div className="min-h-dvh lg:pl-56 print:pl-0">
      <a
        href="#main"
        className="sr-only focus:not-sr-only focus:fixed focus:left-2 focus:top-2 focus:z-50 focus:rounded-md focus:bg-sheet focus:p-3"
      >
        Skip to the page
      </a>
      <Rail entries={entries} user={user} firmName={firm.name} onKeys={keys.open} />
      <main
        id="main"
        aria-busy={loading}
        className="mx-auto max-w-[1400px] px-4 pb-28 pt-4 lg:px-8 lg:pb-12 lg:pt-6 print:p-0"
      >
        <Suspense fallback={<PageSkeleton />}>
          <Outlet />
        </Suspense>
      </main>
      <BottomBar entries={entries} user={user} />
      <KeysDialog role={user.role} open={keys.isOpen} onClose={keys.close} />
    </div>
  )
}

function SignInFirst() {
  const { user } = useSession()
  const { pathname, search } = useLocation()
  if (user) return <SignedInShell user={user} />
  const back = pathname === '/' ? '' : `?to=${encodeURIComponent(pathname + search)}`
  return <Navigate to={`/sign-in${back}`} replace />
}

export function Shell() {
  return (
    <Suspense fallback={<PageSkeleton />}>
      <SignInFirst />
    </Suspense>
  )
}
