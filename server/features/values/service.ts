import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { type Quantity, type QuantityInput, quantityInput } from '#shared/api/quantities.ts';
import { builtInTables } from '#shared/calc/channel-plans.ts';
import { type Program, compile } from '#shared/calc/program.ts';
import { planDefinitions } from '#shared/plan/compile-plan.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { quantities } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import { planOfManual } from './plan.ts';
import { channelTablesOfManual, findQuantity, quantityReply, quantityRows } from './queries.ts';

type Who = Pick<SignedIn, 'id' | 'name'>;

/** The quantities of a manual and of its frequency plan, compiled: order, units and problems. */
export function programOf(db: Connection, manualId: string): Program {
  existingManual(db, manualId);
  const definitions = quantityRows(db, manualId).map(({ definition }) => definition);
  const tables = [...builtInTables, ...channelTablesOfManual(db, manualId)];
  return compile([...definitions, ...planDefinitions(planOfManual(db, manualId))], tables);
}

export function createQuantity(
  tools: Tools,
  who: Who,
  { manualId, given }: { manualId: string; given: QuantityInput },
): Quantity {
  const { db, now, live } = tools;
  const { pageId = null, zone = null, ...definition } = given;
  const row = { id: randomUUID(), manualId, symbol: definition.symbol, definition, pageId, zone, createdAt: now() };
  db.transaction((tx) => {
    existingManual(tx, manualId);
    refuseSameSymbol(tx, { manualId, symbol: definition.symbol });
    tx.insert(quantities).values(row).run();
    record(tx, who, { did: 'added a quantity', subject: definition.symbol, subjectId: row.id, details: { manualId } });
  });
  live.emit({ type: 'quantities', manualId });
  return quantityReply(row);
}

type Naming = { manualId: string; symbol: string; except?: string };

function refuseSameSymbol(tx: Connection, { manualId, symbol, except }: Naming): void {
  if (quantityRows(tx, manualId).some((row) => row.symbol === symbol && row.id !== except)) {
    throw new AppError(
      'already-exists',
      `This manual has a quantity called ${symbol} already. Choose another symbol.`,
      {
        issues: [{ path: 'symbol', message: 'Taken by another quantity of this manual.' }],
      },
    );
  }
}

type Change = { manualId: string; quantityId: string; change: Record<string, unknown> };

export function updateQuantity({ db, live }: Tools, who: Who, { manualId, quantityId, change }: Change): Quantity {
  const reply = db.transaction((tx) => {
    const { id, ...before } = quantityReply(existing(tx, manualId, quantityId));
    const merged = Object.entries({ ...before, ...change }).filter(
      ([, value]) => value !== null && value !== undefined,
    );
    const { pageId = null, zone = null, ...definition } = quantityInput.parse(Object.fromEntries(merged));
    refuseSameSymbol(tx, { manualId, symbol: definition.symbol, except: quantityId });
    tx.update(quantities)
      .set({ symbol: definition.symbol, definition, pageId, zone })
      .where(eq(quantities.id, quantityId))
      .run();
    record(tx, who, {
      did: 'changed a quantity',
      subject: definition.symbol,
      subjectId: id,
      details: { manualId, change },
    });
    return quantityReply(existing(tx, manualId, quantityId));
  });
  live.emit({ type: 'quantities', manualId });
  return reply;
}

export function deleteQuantity({ db, live }: Tools, who: Who, { manualId, quantityId }: Omit<Change, 'change'>): void {
  db.transaction((tx) => {
    const { symbol } = existing(tx, manualId, quantityId);
    tx.delete(quantities).where(eq(quantities.id, quantityId)).run();
    record(tx, who, { did: 'deleted a quantity', subject: symbol, subjectId: quantityId, details: { manualId } });
  });
  live.emit({ type: 'quantities', manualId });
}

function existing(db: Connection, manualId: string, quantityId: string) {
  existingManual(db, manualId);
  const row = findQuantity(db, manualId, quantityId);
  if (row === undefined) throw new AppError('not-found', 'This manual has no such quantity.');
  return row;
}
