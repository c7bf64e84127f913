export const numbersFrom = (first: number, last: number): number[] =>
  Array.from({ length: last - first + 1 }, (_, at) => first + at);
