import type { Edition } from '#shared/api/editions.ts';
import { counted } from '#shared/kit/counted.ts';
import { writtenDay } from '#src/lib/written.ts';

/** `Edition 2, Winter issue` */
export const editionName = ({ number, name }: Pick<Edition, 'number' | 'name'>): string =>
  name === '' ? `Edition ${number}` : `Edition ${number}, ${name}`;

/** For a cell of a title block: `2, Winter issue, 1 Dec 2026` */
export const editionCell = ({ number, name, publishedAt }: Edition): string =>
  [String(number), name, writtenDay(publishedAt)].filter((part) => part !== '').join(', ');

/** What was known against it when it was published, in words; none where all was well. */
export const knownAgainst = ({ standing }: Pick<Edition, 'standing'>): string[] => {
  const { unread, notProofed, doubts, disagreeing } = standing;
  return [
    unread === 0 ? '' : `${counted(unread, 'page')} left out, not read yet`,
    notProofed === 0 ? '' : `${counted(notProofed, 'page')} not proofed`,
    doubts === 0 ? '' : `${counted(doubts, 'doubt')} left`,
    disagreeing === 0 ? '' : `${counted(disagreeing, 'value')} not as printed`,
  ].filter((part) => part !== '');
};
