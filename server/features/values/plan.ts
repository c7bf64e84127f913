import { eq } from 'drizzle-orm';
import * as api from '#shared/api/calculations.ts';
import { AppError } from '#shared/kit/app-error.ts';
import type { FrequencyPlan } from '#shared/plan/plan.ts';
import { frequencyPlans } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';

export function planRoutes(router: ApiRouter, tools: Tools): void {
  serve(router, api.getFrequencyPlan, ({ params }) => {
    existingManual(tools.db, params.manualId);
    return planReply(tools.db, params.manualId);
  });
  serve(router, api.saveFrequencyPlan, ({ user, params, body }) => savePlan(tools, user, { ...params, ...body }));
}

const findPlan = (db: Connection, manualId: string) =>
  db.select().from(frequencyPlans).where(eq(frequencyPlans.manualId, manualId)).get();

/** The plan of a manual; one without stages where nobody has drawn one. */
export const planOfManual = (db: Connection, manualId: string): FrequencyPlan =>
  findPlan(db, manualId)?.content ?? { stages: [] };

function planReply(db: Connection, manualId: string) {
  const row = findPlan(db, manualId);
  if (row === undefined) return { number: 0, plan: { stages: [] }, savedAt: null, savedBy: null };
  return { number: row.number, plan: row.content, savedAt: row.savedAt.toISOString(), savedBy: row.savedBy };
}

type Edit = { manualId: string; baseNumber: number; plan: FrequencyPlan };

function savePlan({ db, now, live }: Tools, who: SignedIn, { manualId, baseNumber, plan }: Edit) {
  db.transaction((tx) => {
    const manual = existingManual(tx, manualId);
    const present = planReply(tx, manualId);
    if (present.number !== baseNumber) {
      throw new AppError(
        'revision-conflict',
        `${present.savedBy ?? 'Somebody'} changed the frequency plan while you worked on it. Take theirs, and make your change again.`,
        { current: present },
      );
    }
    const row = { number: baseNumber + 1, content: plan, savedAt: now(), savedBy: who.name };
    tx.insert(frequencyPlans)
      .values({ manualId, ...row })
      .onConflictDoUpdate({ target: frequencyPlans.manualId, set: row })
      .run();
    record(tx, who, {
      did: 'changed a frequency plan',
      subject: manual.title,
      subjectId: manualId,
      details: { stages: plan.stages.length },
    });
  });
  live.emit({ type: 'quantities', manualId });
  return planReply(db, manualId);
}
