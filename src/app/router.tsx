import { createBrowserRouter } from 'react-router-dom'
import { RouteError } from './route-error.tsx'
import { Shell } from './shell.tsx'
import { Home } from './home.tsx'
import { shellRoutes } from './shell-routes.tsx'
import { publicRoutes } from './public-routes.tsx'
import { NotFoundPage } from './not-found-page.tsx'
import { PageSkeleton } from '../ui/skeleton.tsx'

export const router = createBrowserRouter([
  ...publicRoutes,
  {
    path: '/',
    element: <Shell />,
    // While the first screen's own file is on its way.
    hydrateFallbackElement: <PageSkeleton />,
    errorElement: <RouteError />,
    children: [
      { index: true, element: <Home /> },
      {
        // A fault on one screen leaves the navigation standing.
        errorElement: <RouteError />,
        children: [...shellRoutes, { path: '*', element: <NotFoundPage /> }],
      },
    ],
  },
])
