import type { RouteObject } from 'react-router-dom'
import { PageSkeleton } from '../ui/skeleton.tsx'
import { RouteError } from './route-error.tsx'

/** Screens for somebody not signed in. */
export const publicRoutes: RouteObject[] = [
  {
    errorElement: <RouteError />,
    hydrateFallbackElement: <PageSkeleton />,
    children: [
      {
        path: '/sign-in',
        lazy: async () => ({
          Component: (await import('../features/auth/sign-in-page.tsx')).SignInPage,
        }),
      },
      {
        path: '/reset',
        lazy: async () => ({
          Component: (await import('../features/auth/ask-reset-page.tsx')).AskResetPage,
        }),
      },
      {
        path: '/set-password',
        lazy: async () => ({
          Component: (await import('../features/auth/set-password-page.tsx')).SetPasswordPage,
        }),
      },
    ],
  },
]
