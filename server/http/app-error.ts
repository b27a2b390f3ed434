import type { ProblemCode } from '#shared/contracts/problem.ts';

/** One fault of the input: a JSON Pointer and plain words. */
export interface Issue {
  readonly pointer: string;
  readonly message: string;
}

interface Details {
  /** What happened and what to do next; replaces the code's usual sentence. */
  readonly message?: string;
  readonly issues?: readonly Issue[];
  /** With `stale`: what stands on the server now, as its contract shows it. */
  readonly current?: unknown;
}

/** A refusal that its reader can act on. Anything else that is thrown is a bug and is not shown. */
export class AppError extends Error {
  override readonly name = 'AppError';
  readonly code: ProblemCode;
  readonly details: Details;

  constructor(code: ProblemCode, details: Details = {}) {
    super(details.message ?? code);
    this.code = code;
    this.details = details;
  }
}

/** A refusal of the whole input with its faults. */
export function invalid(...issues: readonly Issue[]): AppError {
  return new AppError('invalid', { issues });
}
