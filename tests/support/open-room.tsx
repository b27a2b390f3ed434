import { render } from '@testing-library/react';
import { vi } from 'vitest';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { Providers } from '#src/app/providers.tsx';
import { routesOf } from '#src/app/router.tsx';
import { createQueryClient } from '#src/lib/query-client.ts';

/** Opens an address of the product as a visitor would: the shell, the room's loader and the room itself. */
export function openRoom(address: string) {
  standInForTheWindow();
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { ...client.getDefaultOptions().queries, retryDelay: 1 } });
  const router = createMemoryRouter(routesOf(client), { initialEntries: [address] });
  const view = render(<Providers client={client}><RouterProvider router={router} /></Providers>);
  return { ...view, router, client };
}

/** What the test page lacks of a browser's window. */
function standInForTheWindow(): void {
  vi.stubGlobal('CSS', { escape: (text: string) => text });
  vi.stubGlobal('scrollTo', () => undefined);
  vi.stubGlobal('ResizeObserver', class { observe() {} unobserve() {} disconnect() {} });
  vi.stubGlobal('matchMedia', (media: string) => ({ media, matches: false, addEventListener() {}, removeEventListener() {}, addListener() {}, removeListener() {} }));
  // The router's requests are checked by Node's own class, which knows only Node's own signals.
  vi.stubGlobal('Request', class extends Request {
    constructor(input: RequestInfo | URL, { signal: _signal, ...init }: RequestInit = {}) {
      super(input, init);
    }
  });
}
