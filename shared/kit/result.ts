/** An expected outcome: a value, or an error that a person can act on. */
export type Result<T, E> = { ok: true; value: T } | { ok: false; error: E };
export const succeed = <T>(value: T): Result<T, never> => ({ ok: true, value });
export const fail = <E>(error: E): Result<never, E> => ({ ok: false, error });
