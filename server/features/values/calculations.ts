import { stringify } from 'csv-stringify/sync';
import * as api from '#shared/api/calculations.ts';
import { type ChangeSheet, type Occurrence, changeSheet } from '#shared/calc/change-sheet.ts';
import { allNodes, textOf } from '#shared/document/text-of.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { type ApiRouter, serve, serveRaw } from '#server/http/serve.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { Tools } from '#server/http/tools.ts';
import { channelTablesOfManual, pagesWithLiveValues, quantityRows } from './queries.ts';
import { programOf } from './service.ts';

export function calculationSheetRoutes(router: ApiRouter, { db }: Tools): void {
  serve(router, api.listChannelTables, ({ params }) => {
    existingManual(db, params.manualId);
    return { items: channelTablesOfManual(db, params.manualId), nextCursor: null };
  });
  serveRaw(router, api.getChangeSheet, ({ params, query, body, response }) => {
    const manual = existingManual(db, params.manualId);
    const sheet = changeSheet(programOf(db, manual.id), occurrencesIn(db, manual.id), body);
    if (query.format === 'json') {
      response.json(api.getChangeSheet.reply.parse(sheet));
      return;
    }
    response.attachment(`${manual.documentNumber ?? manual.title} change sheet.csv`).type('text/csv');
    response.send(csvOf(sheet));
  });
}

function occurrencesIn(db: Connection, manualId: string): Occurrence[] {
  const symbols = new Map(quantityRows(db, manualId).map(({ id, symbol }) => [id, symbol]));
  return pagesWithLiveValues(db, manualId).flatMap(({ pageId, pageLabel, document }) =>
    [...allNodes(document)].flatMap((node) => {
      const symbol = node.type === 'liveValue' ? symbols.get(String(node.attrs?.['quantity'])) : undefined;
      return symbol === undefined ? [] : [{ pageId, pageLabel, symbol, printed: textOf(node) }];
    }),
  );
}

const columns = ['page', 'symbol', 'label', 'printed', 'before', 'after', 'limits', 'problem'];

const csvOf = ({ rows }: ChangeSheet): string =>
  stringify(
    [
      columns,
      ...rows.map(({ pageLabel, symbol, label, printed, before, after, limits, problem }) =>
        [pageLabel, symbol, label, printed, before, after, limits, problem].map((cell) => cell ?? ''),
      ),
    ],
    { escape_formulas: true },
  );
