import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Edition } from '#shared/api/editions.ts';
import type { Page } from '#shared/api/pages.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { counted } from '#shared/kit/counted.ts';
import { pageOfEdition } from '#src/api/editions.ts';
import { type ChangeBars, changeBars } from '#src/blocks/compare/change-bars.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { useStored } from '#src/lib/use-stored.ts';
import { editionName } from './edition-words.ts';

const switches = ['off', 'on'] as const;

type Bars = { areOn: boolean; turn: (areOn: boolean) => void; bars: ChangeBars | null; state: string };

/** Bars beside what changed on a page since an earlier edition; off until somebody wants them. */
export function useChangeBars(page: Page, before: Edition | null): Bars {
  const [chosen, choose] = useStored('benchleaf.bars', switches, 'off');
  const areOn = chosen === 'on' && before !== null;
  const earlier = useQuery({ ...pageOfEdition(page.manualId, before?.number ?? 0, page.id), enabled: areOn });
  const isNew = earlier.error instanceof AppError && earlier.error.code === 'not-found';
  const was = isNew ? null : earlier.data?.document;
  const bars = useMemo(
    () =>
      !areOn || was === undefined || page.document === null
        ? null
        : changeBars(was, page.document, editionName(before)),
    [areOn, was, page.document, before],
  );
  const failed = earlier.error === null || isNew ? 'Looking up what changed …' : saidBy(earlier.error);
  return {
    areOn,
    turn: (on) => choose(on ? 'on' : 'off'),
    bars,
    state: bars === null ? failed : wordsFor(bars, isNew),
  };
}

function wordsFor({ blocks, goneBehind, since }: ChangeBars, isNew: boolean): string {
  if (isNew) return `This page is new since ${since}.`;
  const count = blocks.size + goneBehind.size;
  return count === 0 ? `Nothing changed here since ${since}.` : `${counted(count, 'change')} since ${since}.`;
}
