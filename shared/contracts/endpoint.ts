import type { z } from 'zod';

/** One HTTP endpoint: the only place where its URL and shapes are written. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** Express path below `/api`, with `:name` parameters. */
  readonly path: string;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  readonly response: Response;
  /** `json` unless the answer is bytes: then `response` is not parsed. */
  readonly answers?: 'json' | 'pdf' | 'file';
  /** `multipart` for uploads: one part `file`, the body schema reads the other fields. */
  readonly accepts?: 'json' | 'multipart';
}

/** Keeps the exact schema types of an endpoint. */
export function endpoint<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  definition: Endpoint<P, Q, B, R>,
): Endpoint<P, Q, B, R> {
  return definition;
}
