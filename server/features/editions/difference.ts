import type { EditionDifference } from '#shared/api/editions.ts';
import type { Quantity } from '#shared/api/quantities.ts';
import { textOf } from '#shared/document/text-of.ts';
import { compareLists } from '#shared/kit/compare-lists.ts';
import type { FrequencyPlan } from '#shared/plan/plan.ts';
import { documentOfPage } from '#server/features/revisions/index.ts';
import { planOfManual, quantityReply, quantityRows } from '#server/features/values/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import { type EditionRow, existingEdition, pagesOfEdition, pagesOfWork } from './queries.ts';

/** A manual in one state: published, or as it is being worked on. */
export type ManualState = {
  pages: { pageId: string; label: string; revision: number }[];
  quantities: Quantity[];
  plan: FrequencyPlan;
};

export const stateOfEdition = (db: Connection, { id, quantities, plan }: EditionRow): ManualState => ({
  pages: pagesOfEdition(db, id),
  quantities,
  plan,
});

export const stateOfWork = (db: Connection, manualId: string): ManualState => ({
  pages: pagesOfWork(db, manualId)
    .filter(({ revision }) => revision > 0)
    .map(({ id, label, revision }) => ({ pageId: id, label, revision })),
  quantities: quantityRows(db, manualId).map(quantityReply),
  plan: planOfManual(db, manualId),
});

type Between = { manualId: string; number: number; to: number | 'work' };

/** What a later state of the manual has otherwise than an edition. */
export function differenceBetween(db: Connection, { manualId, number, to }: Between): EditionDifference {
  const older = stateOfEdition(db, existingEdition(db, manualId, number));
  const newer = to === 'work' ? stateOfWork(db, manualId) : stateOfEdition(db, existingEdition(db, manualId, to));
  return { from: number, to, ...differenceOf(db, older, newer) };
}

const withId = ({ pageId, label, revision }: ManualState['pages'][number]) => ({ id: pageId, pageId, label, revision });

/** Where a stage stands in the drawing is no part of what it says. */
const stagesOf = ({ stages }: FrequencyPlan) => stages.map(({ place: _place, ...stage }) => stage);
const nameOfStage = ({ id, name }: { id: string; name: string }): string => (name === '' ? id : name);

export function differenceOf(
  db: Connection,
  older: ManualState,
  newer: ManualState,
): Omit<EditionDifference, 'from' | 'to'> {
  const pages = compareLists(older.pages.map(withId), newer.pages.map(withId));
  const stages = compareLists(stagesOf(older.plan), stagesOf(newer.plan));
  return {
    pages: {
      ...pages,
      changed: pages.changed.map(({ before, after }) => changedPage(db, before, after)),
      same: newer.pages.length - pages.added.length - pages.changed.length,
    },
    quantities: compareLists(older.quantities, newer.quantities),
    plan: {
      added: stages.added.map(nameOfStage),
      removed: stages.removed.map(nameOfStage),
      changed: stages.changed.map(({ after }) => nameOfStage(after)),
    },
  };
}

type PageState = ReturnType<typeof withId>;

function changedPage(db: Connection, before: PageState, after: PageState) {
  const { pageId, label } = after;
  const words = (revision: number): string => {
    const document = documentOfPage(db, pageId, revision);
    return document === null ? '' : textOf(document);
  };
  const isSame = before.revision === after.revision || words(before.revision) === words(after.revision);
  return {
    pageId,
    label,
    from: before.revision,
    to: after.revision,
    change: isSame ? ('form' as const) : ('words' as const),
  };
}

export const isNothing = ({ pages, quantities, plan }: Omit<EditionDifference, 'from' | 'to'>): boolean =>
  [pages, quantities, plan].every(
    ({ added, removed, changed }) => added.length + removed.length + changed.length === 0,
  );
