import type { Endpoint } from '#shared/contracts/endpoint.ts';

export interface Place {
  readonly params?: Readonly<Record<string, unknown>>;
  readonly query?: Readonly<Record<string, unknown>>;
}

/** The address of an endpoint below this page's origin; empty query values are left out. */
export function urlOf(endpoint: Pick<Endpoint, 'path'>, place: Place = {}): string {
  const path = endpoint.path.replace(/:(\w+)/g, (_, key: string) => encodeURIComponent(String(place.params?.[key] ?? '')));
  const search = new URLSearchParams();
  for (const [key, value] of Object.entries(place.query ?? {})) {
    if (value !== undefined && value !== null && value !== '') search.set(key, String(value));
  }
  const text = search.toString();
  return `/api${path}${text ? `?${text}` : ''}`;
}
