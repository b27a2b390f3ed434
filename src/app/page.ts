import type { QueryClient } from '@tanstack/react-query';
import type { ComponentType } from 'react';
import type { LoaderFunctionArgs } from 'react-router-dom';
import { redirect } from 'react-router-dom';
import { sessionQueries } from '#src/features/session/queries.ts';
import { isRefusal } from '#src/lib/api/error.ts';
import { paths } from './paths.ts';

/**
 * What a route file exports: `Component`, and a `loader` that starts all its queries and
 * awaits them together. A loader gets the cache by hand; it returns nothing, components
 * read the same queries.
 */
export interface Page {
  readonly Component: ComponentType;
  readonly loader?: PageLoader;
  readonly ErrorBoundary?: ComponentType;
}
export type PageLoader = (client: QueryClient, args: LoaderFunctionArgs) => Promise<unknown>;

/** A route that is fetched when first visited. */
export function page(client: QueryClient, load: () => Promise<Page>) {
  return async () => {
    const { Component, loader, ErrorBoundary } = await load();
    return {
      Component,
      ...(ErrorBoundary ? { ErrorBoundary } : {}),
      loader: loader ? (args: LoaderFunctionArgs) => keepPlace(args, () => loader(client, args)) : undefined,
    };
  };
}

/** A visitor who is not signed in goes to sign-in and comes back to the same place. */
export async function keepPlace(args: LoaderFunctionArgs, load: () => Promise<unknown>): Promise<unknown> {
  try {
    return (await load()) ?? null;
  } catch (error) {
    if (!isRefusal(error, 'not-signed-in')) throw error;
    const { pathname, search } = new URL(args.request.url);
    return redirect(`${paths.signIn}?to=${encodeURIComponent(pathname + search)}`);
  }
}

/** The loader of the shell: there is a session, or sign-in comes first. */
export function requireSession(client: QueryClient) {
  return (args: LoaderFunctionArgs) => keepPlace(args, () => client.ensureQueryData(sessionQueries.current()));
}
