/** A mistake in our own tables or code: stops a start or a test, never a user's typing. */
export class DomainError extends Error {
  override readonly name = 'DomainError';
}

/** Closes a switch over a union, so that a new member does not compile until it is handled. */
export function assertNever(value: never): never {
  throw new DomainError(`not expected here: ${JSON.stringify(value)}`);
}
