import type { QueryClient } from '@tanstack/react-query'
import { createBrowserRouter } from 'react-router-dom'
import type { RouteObject } from 'react-router-dom'
import { RouteError } from './error-boundary.tsx'
import { redirectSignedIn, requireSignIn } from './require-sign-in.ts'
import { Frame } from './shell/frame.tsx'

/** The page of parts is for building with; it is in no production bundle. */
const withParts = import.meta.env.DEV || import.meta.env.VITE_PARTS === '1'

const partsRoutes: RouteObject[] = withParts
  ? [{ path: 'parts', lazy: () => import('../parts/parts-page.tsx') }]
  : []

/**
 * Every address below the frame. A screen is lazy: its module exports `Component`. A sheet stands here only when its
 * feature is in this version, and is then named in landed-sheets.ts too.
 */
const sheetRoutes: RouteObject[] = [
  { path: 'not-in-this-version/:sheet', lazy: () => import('./routes/not-in-this-version.tsx') },
  { path: 'settings/own', lazy: () => import('./routes/own-settings.tsx') },
]

/** The routes of the whole client. */
export function createRoutes(client: QueryClient): RouteObject[] {
  return [
    {
      ErrorBoundary: RouteError,
      HydrateFallback: () => null,
      children: [
        { path: 'sign-in', loader: redirectSignedIn(client), lazy: () => import('./routes/sign-in.tsx') },
        {
          path: 'new-password',
          loader: requireSignIn(client),
          lazy: () => import('./routes/new-password.tsx'),
        },
        ...partsRoutes,
        {
          Component: Frame,
          loader: requireSignIn(client),
          children: [
            {
              ErrorBoundary: RouteError,
              children: [...sheetRoutes, { path: '*', lazy: () => import('./routes/not-found.tsx') }],
            },
          ],
        },
      ],
    },
  ]
}

/** The router of the browser. */
export function createRouter(client: QueryClient) {
  return createBrowserRouter(createRoutes(client))
}
