type Page<T> = { items: T[]; nextCursor: string | null };

const mostPages = 40;

/** Fetches a whole list, page after page. For lists that a screen shows whole; bounded, so that a fault cannot loop. */
export async function everyItem<T>(fetchPage: (cursor: { cursor?: string }) => Promise<Page<T>>): Promise<T[]> {
  const items: T[] = [];
  let next: string | null = null;
  for (let at = 0; at < mostPages; at += 1) {
    const page: Page<T> = await fetchPage(next === null ? {} : { cursor: next });
    items.push(...page.items);
    next = page.nextCursor;
    if (next === null) break;
  }
  return items;
}
