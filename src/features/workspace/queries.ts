import { queryOptions } from '@tanstack/react-query';

/** The engine and the law tables: one chunk, fetched when a product is first opened. */
export const engineQuery = queryOptions({
  queryKey: ['engine'] as const,
  queryFn: async () => (await import('./engine.ts')).createEngine(),
  staleTime: Infinity,
  gcTime: Infinity,
  structuralSharing: false,
});
