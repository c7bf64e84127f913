/** The words of a failure that a person may read. */
export const saidBy = (error: unknown): string =>
  error instanceof Error && error.message !== '' ? error.message : 'Something went wrong. Try again.';
