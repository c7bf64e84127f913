import type { Manual } from '#shared/api/manuals.ts';

/** The manuals in whose record every word of the filter stands somewhere. */
export function matching(manuals: readonly Manual[], filter: string): Manual[] {
  const words = filter.toLowerCase().split(/\s+/).filter(Boolean);
  return manuals.filter(({ title, equipment, maker, documentNumber, editionDate }) => {
    const record = [title, equipment, maker, documentNumber, editionDate].join(' ').toLowerCase();
    return words.every((word) => record.includes(word));
  });
}
