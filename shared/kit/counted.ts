/** "1 page", "24 pages", "no pages". */
export const counted = (count: number, one: string, many = `${one}s`): string =>
  count === 0 ? `no ${many}` : `${count.toLocaleString('en')} ${count === 1 ? one : many}`;
