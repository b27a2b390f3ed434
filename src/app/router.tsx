import type { QueryClient } from '@tanstack/react-query';
import type { RouteObject } from 'react-router-dom';
import { createBrowserRouter } from 'react-router-dom';
import { ErrorScreen, NotFoundScreen, PageError } from './error-screens.tsx';
import { page, requireSession } from './page.ts';
import { Shell } from './shell.tsx';

/** The route table: every room, fetched when first entered. */
export function routesOf(client: QueryClient): RouteObject[] {
  return [
    { path: '/sign-in', lazy: page(client, () => import('#src/routes/sign-in.tsx')), ErrorBoundary: ErrorScreen },
    { path: '/signed-in', lazy: page(client, () => import('#src/routes/signed-in.tsx')), ErrorBoundary: ErrorScreen },
    {
      id: 'shell',
      path: '/',
      Component: Shell,
      loader: requireSession(client),
      // The session is asked for once, not at every step inside the house.
      shouldRevalidate: () => false,
      ErrorBoundary: ErrorScreen,
      HydrateFallback: Opening,
      children: [
        {
          ErrorBoundary: PageError,
          children: [
            { index: true, lazy: page(client, () => import('#src/routes/today.tsx')) },
            { path: 'products', lazy: page(client, () => import('#src/routes/products.tsx')) },
            { path: 'products/new', lazy: page(client, () => import('#src/routes/product-new.tsx')) },
            {
              path: 'products/:id',
              lazy: page(client, () => import('#src/routes/product.tsx')),
              children: [
                { index: true, lazy: page(client, () => import('#src/routes/product-formula.tsx')) },
                { path: 'declaration', lazy: page(client, () => import('#src/routes/product-declaration.tsx')) },
                { path: 'verdicts', lazy: page(client, () => import('#src/routes/product-verdicts.tsx')) },
                { path: 'label', lazy: page(client, () => import('#src/routes/product-label.tsx')) },
                { path: 'report', lazy: page(client, () => import('#src/routes/product-report.tsx')) },
                { path: 'trail', lazy: page(client, () => import('#src/routes/product-trail.tsx')) },
              ],
            },
            {
              path: 'materials',
              lazy: page(client, () => import('#src/routes/materials.tsx')),
              children: [
                { index: true, lazy: page(client, () => import('#src/routes/materials-start.tsx')) },
                { path: 'new', lazy: page(client, () => import('#src/routes/material-new.tsx')) },
                { path: ':id', lazy: page(client, () => import('#src/routes/material.tsx')), ErrorBoundary: PageError },
              ],
            },
            { path: 'read', lazy: page(client, () => import('#src/routes/read.tsx')) },
            { path: 'calendar', lazy: page(client, () => import('#src/routes/calendar.tsx')) },
            { path: 'dictionary', lazy: page(client, () => import('#src/routes/dictionary.tsx')) },
            { path: 'dictionary/:inci', lazy: page(client, () => import('#src/routes/dictionary-entry.tsx')) },
            { path: 'house', lazy: page(client, () => import('#src/routes/house.tsx')) },
            { path: 'trail', lazy: page(client, () => import('#src/routes/trail.tsx')) },
            { path: '*', Component: NotFoundScreen },
          ],
        },
      ],
    },
  ];
}

export function createAppRouter(client: QueryClient) {
  return createBrowserRouter(routesOf(client));
}

/** The glass alone, while the first answer is on its way: the page does not jump when it comes. */
function Opening() {
  return (
    <>
      <div className="glass"><div className="wrap" /></div>
      <main id="main" aria-busy="true"><div className="deck"><div className="wrap deck-head"><p className="facts">&nbsp;</p><h1><span className="sr-only">Opening Colophon</span>&nbsp;</h1></div></div></main>
    </>
  );
}
