import type { z } from 'zod';
import type { SearchHit, search } from '#shared/api/search.ts';
import { holdsAll, markHits, markQuantity } from '#shared/search/mark-hits.ts';
import { keyOf } from '#shared/search/quantities-in.ts';
import { type Term, fullTextExpression, parseQuery, trigramExpression } from '#shared/search/query.ts';
import type { Tools } from '#server/http/tools.ts';
import {
  type EntryRow,
  entriesOf,
  matching,
  pageEntries,
  pageTitles,
  quantitiesCalled,
  quantityPlaces,
} from './queries.ts';

type Query = Pick<z.output<(typeof search)['query']>, 'q' | 'manualId' | 'kind'>;
type SearchTools = Pick<Tools, 'db' | 'raw'>;
export type Found = { hits: SearchHit[]; close: boolean };

/** As many pages are looked at for near matches; more than a person would read through. */
const mostClose = 60;
/** A quantity that is the one asked for stands before any page that merely has its digits. */
const quantityScore = 1000;

/** Finds what was typed: quantities by value, text and parts by word; words bent by recognition only when nothing else is found. */
export function findAll(tools: SearchTools, query: Query, most: number): Found {
  const terms = parseQuery(query.q);
  const quantityHits = query.kind === undefined || query.kind === 'quantity' ? findQuantities(tools, query) : [];
  if (query.kind === 'quantity' || terms.length === 0) return { hits: quantityHits, close: false };
  const exact = findWords(tools, query, { terms, most });
  if (exact.length + quantityHits.length > 0) return { hits: [...quantityHits, ...exact], close: false };
  const close = findClose(tools, query, terms);
  return { hits: close, close: close.length > 0 };
}

function findWords(
  { db, raw }: SearchTools,
  { manualId, kind }: Query,
  { terms, most }: { terms: Term[]; most: number },
): SearchHit[] {
  const wordKind = kind === 'quantity' ? undefined : kind;
  const found = matching(raw, 'search_words', {
    expression: fullTextExpression(terms),
    kind: wordKind,
    manualId,
    limit: most,
  });
  return hitsFrom(db, found, (entry) => markHits(entry.placed, terms));
}

function findClose({ db, raw }: SearchTools, { manualId, kind }: Query, terms: Term[]): SearchHit[] {
  const expression = trigramExpression(terms);
  if (expression === null) return [];
  const wordKind = kind === 'quantity' ? undefined : kind;
  const found = matching(raw, 'search_trigrams', { expression, kind: wordKind, manualId, limit: mostClose });
  return hitsFrom(db, found, (entry) =>
    holdsAll(entry.placed, terms, true) ? markHits(entry.placed, terms, true) : null,
  );
}

type Marked = ReturnType<typeof markHits> | null;

type Title = { label: string; manualTitle: string };
type Seen = Pick<SearchHit, 'kind' | 'snippet' | 'marks' | 'boxes' | 'score'>;

const hitOn = (
  { manualId, pageId }: EntryRow,
  { label, manualTitle }: Title,
  { kind, snippet, marks, boxes, score }: Seen,
): SearchHit => ({ kind, manualId, manualTitle, pageId, label, snippet, marks, boxes, score });

/** The rows of a search as hits, in the order found. */
function hitsFrom(
  db: Tools['db'],
  found: { id: number; score: number }[],
  mark: (entry: EntryRow) => Marked,
): SearchHit[] {
  const entries = new Map(
    entriesOf(
      db,
      found.map(({ id }) => id),
    ).map((entry) => [entry.id, entry]),
  );
  const titles = pageTitles(db, [...new Set([...entries.values()].map(({ pageId }) => pageId))]);
  return found.flatMap(({ id, score }): SearchHit[] => {
    const entry = entries.get(id);
    const title = entry === undefined ? undefined : titles.get(entry.pageId);
    const marked = entry === undefined ? null : mark(entry);
    if (entry === undefined || title === undefined || marked === null) return [];
    return [hitOn(entry, title, { ...marked, kind: entry.kind, score })];
  });
}

function findQuantities({ db }: SearchTools, { q, manualId }: Query): SearchHit[] {
  return [...printedQuantities(db, q, manualId), ...namedQuantities(db, q, manualId)];
}

function printedQuantities(db: Tools['db'], q: string, manualId: string | undefined): SearchHit[] {
  const key = keyOf(q);
  if (key === null) return [];
  const places = quantityPlaces(db, key, manualId);
  const pageIds = [...new Set(places.map(({ pageId }) => pageId))];
  const titles = pageTitles(db, pageIds);
  return pageEntries(db, pageIds).flatMap((entry): SearchHit[] => {
    const title = titles.get(entry.pageId);
    if (title === undefined) return [];
    const marked = markQuantity(
      entry.placed,
      places.filter(({ pageId }) => pageId === entry.pageId),
    );
    return [hitOn(entry, title, { ...marked, kind: 'quantity', score: quantityScore })];
  });
}

function namedQuantities(db: Tools['db'], q: string, manualId: string | undefined): SearchHit[] {
  return quantitiesCalled(db, q, manualId).map(({ quantity, manualTitle }) => {
    const { definition, pageId, zone } = quantity;
    const value =
      definition.printed?.text ??
      (definition.home === undefined ? (definition.expression ?? '') : `${definition.home} ${definition.unit}`);
    const snippet = `${definition.label || definition.symbol}: ${value}`;
    const boxes = zone === null ? [] : [zone];
    return {
      kind: 'quantity',
      manualId: quantity.manualId,
      manualTitle,
      pageId,
      label: definition.symbol,
      snippet,
      marks: [],
      boxes,
      score: quantityScore / 2,
    };
  });
}
