import type { Problem, ProblemCode } from '#shared/contracts/problem.ts';

/** A refusal of the server, or a connection that did not reach it. */
export class ApiError extends Error {
  override readonly name = 'ApiError';

  constructor(readonly problem: Problem) {
    super(problem.detail);
  }

  get code(): ProblemCode {
    return this.problem.code;
  }
  get issues(): readonly { pointer: string; message: string }[] {
    return this.problem.issues ?? [];
  }
}

/** The browser could not reach the server: worth another try, nothing is lost. */
export class OfflineError extends Error {
  override readonly name = 'OfflineError';

  constructor() {
    super('Colophon cannot be reached. What you typed is kept on this computer.');
  }
}

/** An answer that does not have the shape agreed: a fault of ours, never of what was typed. */
export class AnswerError extends Error {
  override readonly name = 'AnswerError';

  constructor(endpoint: string, reason: string) {
    super(`The answer of ${endpoint} could not be read: ${reason}`);
  }
}

/** True where `error` is a refusal with this code. */
export function isRefusal(error: unknown, code: ProblemCode): error is ApiError {
  return error instanceof ApiError && error.code === code;
}

/** A sentence for the eye, whatever was thrown. */
export function sayError(error: unknown): string {
  if (error instanceof ApiError || error instanceof OfflineError) return error.message;
  return 'Something went wrong on our side. Nothing you typed is lost; try again.';
}
