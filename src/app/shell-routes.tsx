import type { RouteObject } from 'react-router-dom'

/** Screens inside the shell, one lazy file each; `permission` of the first navigation entry guards none: the server does. */
export const shellRoutes: RouteObject[] = [
  {
    path: 'account',
    lazy: async () => ({
      Component: (await import('../features/auth/account-page.tsx')).AccountPage,
    }),
  },
]
