import type { QueryClient } from '@tanstack/react-query'
import { createBrowserRouter, redirect } from 'react-router-dom'
import type { RouteObject } from 'react-router-dom'
import { paths } from '../lib/paths.ts'
import { RouteError } from './error-boundary.tsx'
import { redirectSignedIn, requireSignIn } from './require-sign-in.ts'

/** The page of parts is for building with; it is in no production bundle. */
const withParts = import.meta.env.DEV || import.meta.env.VITE_PARTS === '1'

const partsRoutes: RouteObject[] = withParts
  ? [
      { path: 'parts', lazy: () => import('../parts/parts-page.tsx') },
      { path: 'parts/sheet', lazy: () => import('../parts/sheet-page.tsx') },
    ]
  : []

/**
 * Every address below the frame. A screen is lazy: its module exports `Component`. A sheet stands here only when its
 * feature is in this version, and is then named in landed-sheets.ts too.
 */
const sheetRoutes: RouteObject[] = [
  { index: true, lazy: () => import('./routes/today.tsx') },
  { path: 'not-in-this-version/:sheet', lazy: () => import('./routes/not-in-this-version.tsx') },
  { path: 'water', lazy: () => import('./routes/water.tsx') },
  { path: 'water/map', lazy: () => import('./routes/water-map.tsx') },
  { path: 'water/new', lazy: () => import('./routes/enclosure-new.tsx') },
  { path: 'enclosures/:code', lazy: () => import('./routes/enclosure.tsx') },
  { path: 'enclosures/:code/edit', lazy: () => import('./routes/enclosure-edit.tsx') },
  { path: 'enclosures/:code/measure', lazy: () => import('./routes/enclosure-measure.tsx') },
  { path: 'enclosures/:code/readings', lazy: () => import('./routes/enclosure-readings.tsx') },
  { path: 'enclosures/:code/volume', lazy: () => import('./routes/enclosure-volume.tsx') },
  { path: 'enclosures/:code/volumes', lazy: () => import('./routes/enclosure-volumes.tsx') },
  { path: 'quarantine', lazy: () => import('./routes/quarantine/board.tsx') },
  { path: 'quarantine/new', lazy: () => import('./routes/quarantine/new-case.tsx') },
  { path: 'quarantine/:number/clearance', lazy: () => import('./routes/quarantine/clearance.tsx') },
  { path: 'quarantine/:number', lazy: () => import('./routes/quarantine/case.tsx') },
  { path: 'rounds', lazy: () => import('./routes/quarantine/rounds.tsx') },
  { path: 'unsent', lazy: () => import('./routes/quarantine/unsent.tsx') },
  { path: 'animals', lazy: () => import('./routes/animals.tsx') },
  { path: 'animals/:accession', lazy: () => import('./routes/animal.tsx') },
  { path: 'orders', lazy: () => import('./routes/orders/orders.tsx') },
  { path: 'orders/new', lazy: () => import('./routes/orders/new-order.tsx') },
  { path: 'orders/by-weight', lazy: () => import('./routes/orders/by-weight.tsx') },
  { path: 'orders/:number/edit', lazy: () => import('./routes/orders/edit-order.tsx') },
  { path: 'orders/:number', lazy: () => import('./routes/orders/order.tsx') },
  { path: 'orders/:number/sheet', lazy: () => import('./routes/orders/sheet.tsx') },
  { path: 'pharmacy', loader: () => redirect(paths.formulary()) },
  { path: 'pharmacy/formulary', lazy: () => import('./routes/pharmacy/formulary.tsx') },
  { path: 'pharmacy/formulary/:id', lazy: () => import('./routes/pharmacy/dose-line.tsx') },
  { path: 'settings', loader: () => redirect(paths.ownSettings()) },
  { path: 'settings/own', lazy: () => import('./routes/own-settings.tsx') },
  { path: 'settings/people', lazy: () => import('./routes/people.tsx') },
  { path: 'settings/people/new', lazy: () => import('./routes/new-person.tsx') },
  { path: 'settings/people/:id', lazy: () => import('./routes/person.tsx') },
  { path: 'settings/facility', lazy: () => import('./routes/facility-settings.tsx') },
  { path: 'settings/rules', lazy: () => import('./routes/rules.tsx') },
  { path: 'settings/audit', lazy: () => import('./routes/audit.tsx') },
  { path: 'register', lazy: () => import('./routes/register/transactions.tsx') },
  { path: 'register/acquisitions/new', lazy: () => import('./routes/register/new-acquisition.tsx') },
  { path: 'register/dispositions/new', lazy: () => import('./routes/register/new-disposition.tsx') },
  { path: 'register/transactions/:number', lazy: () => import('./routes/register/transaction.tsx') },
  { path: 'register/histories/:accession', lazy: () => import('./routes/register/history.tsx') },
  { path: 'register/permits', lazy: () => import('./routes/register/permits.tsx') },
  { path: 'register/permits/new', lazy: () => import('./routes/register/new-permit.tsx') },
  { path: 'register/permits/:number', lazy: () => import('./routes/register/permit.tsx') },
  { path: 'register/exports', lazy: () => import('./routes/register/exports.tsx') },
  { path: 'register/parties', lazy: () => import('./routes/register/parties.tsx') },
  { path: 'bench', lazy: () => import('./routes/bench/bench.tsx') },
  { path: 'bench/:calculator', lazy: () => import('./routes/bench/calculator.tsx') },
  { path: 'check', lazy: () => import('./routes/check.tsx') },
  { path: 'check/:fingerprint', lazy: () => import('./routes/check.tsx') },
]

/** Sheets for the hand: no bridge over them. */
const handRoutes: RouteObject[] = [
  { path: 'enclosures/:code/observe', lazy: () => import('./routes/quarantine/observe.tsx') },
  { path: 'urgent/:id', lazy: () => import('./routes/quarantine/urgent.tsx') },
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
          lazy: () => import('./shell/hand-frame.tsx'),
          loader: requireSignIn(client),
          children: [{ ErrorBoundary: RouteError, children: handRoutes }],
        },
        {
          lazy: () => import('./shell/frame.tsx'),
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
