import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { LiveValue } from '#shared/calc/describe-value.ts';
import { evaluate } from '#shared/calc/evaluate.ts';
import { compile } from '#shared/calc/program.ts';
import { checkPlan } from '#shared/plan/check-plan.ts';
import { compilePlan } from '#shared/plan/compile-plan.ts';
import type { Finding } from '#shared/plan/finding.ts';
import type { FrequencyPlan, Stage, StageKind } from '#shared/plan/plan.ts';
import { symbolOfStage } from '#shared/plan/stage-words.ts';
import { planOfManual, savePlan } from '#src/api/calculations.ts';
import { useCan } from '#src/api/session.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useLiveStore, useSetting } from '#src/blocks/live-value/live-values.tsx';
import { cx } from '#src/lib/class-names.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { toast } from '#src/ui/toast.ts';
import { layoutOf } from './dependency-layout.ts';
import { Graph } from './graph.tsx';
import { stageWords, withChanged, withStage, withoutStage } from './plan-edits.ts';
import { StageForm } from './stage-form.tsx';

/** The signal chain of the set, drawn, worked out at the present setting, looked over, and edited in place. */
export function PlanView({ manualId }: { manualId: string }) {
  const store = useLiveStore();
  const { data: stored } = useQuery(planOfManual(manualId));
  if (store === null || stored === undefined) return <Pending what="Fetching the frequency plan …" />;
  return <Editing key={stored.number} store={store} number={stored.number} />;
}

function Editing({ store, number }: { store: LiveStore; number: number }) {
  const mayEdit = useCan('edit-quantities');
  const save = useMutation(savePlan(useQueryClient(), store.manualId));
  const [plan, setPlan] = useState(store.plan);
  const [chosen, setChosen] = useState<string | null>(null);
  const { values, problems, findings } = useWorkedOut(store, plan);
  const stage = plan.stages.find(({ id }) => id === chosen);
  const isChanged = plan !== store.plan;
  // The saved plan is a new one to edit, so this component is gone by the time the saving is over.
  const keep = (): Promise<unknown> =>
    save.mutateAsync({ baseNumber: number, plan }).then(
      () => toast('The plan is saved.'),
      () => undefined,
    );
  const add = (kind: StageKind): void => {
    const made = withStage(plan, kind, chosen);
    setPlan(made.plan);
    setChosen(made.id);
  };
  return (
    <section aria-label="Frequency plan">
      {mayEdit ? (
        <div className="screen-only mb-3 flex flex-wrap items-center gap-3">
          <AddStage behind={stage} onAdd={add} />
          <Button
            look="main"
            className="ml-auto"
            disabled={!isChanged}
            busy={save.isPending && 'Saving …'}
            onClick={() => void keep()}
          >
            Save the plan
          </Button>
          <Button disabled={!isChanged} onClick={() => setPlan(store.plan)}>
            Back to the saved one
          </Button>
        </div>
      ) : null}
      {save.error === null ? null : (
        <Notice kind="alarm" title="The plan is not saved" className="mb-3">
          {saidBy(save.error)}
        </Notice>
      )}
      {plan.stages.length === 0 ? (
        <Empty title="No signal chain has been drawn yet">
          Begin with what comes in: an input at the channel’s frequency, and the crystal oscillator. Then add what they
          feed, stage by stage. Every stage becomes a value of this manual.
        </Empty>
      ) : (
        <div className="plan-sheet">
          <Graph label="Drawing of the signal chain" layout={layoutOfPlan(plan)} chosen={chosen}>
            {(id) => (
              <StageBox
                stage={plan.stages.find((each) => each.id === id)}
                value={values[symbolOfStage(id)]}
                worst={worstOf(findings, id)}
                isChosen={id === chosen}
                onChoose={() => setChosen(id)}
              />
            )}
          </Graph>
          {stage === undefined ? (
            <p className="text-pencil">
              Choose a stage to see what was found of it{mayEdit ? ', or to change it' : ''}.
            </p>
          ) : (
            <StageForm
              key={stage.id}
              {...{ plan, stage, mayEdit }}
              problems={problems.filter((each) => each.stage === stage.id).map(({ message }) => message)}
              findings={findings.filter((each) => each.stage === stage.id)}
              onChange={(changed) => setPlan(withChanged(plan, changed))}
              onRemove={() => {
                setPlan(withoutStage(plan, stage.id));
                setChosen(null);
              }}
            />
          )}
        </div>
      )}
    </section>
  );
}

/** The plan as it stands in the drawing, saved or not, at the present setting. */
function useWorkedOut(store: LiveStore, plan: FrequencyPlan) {
  const setting = useSetting();
  return useMemo(() => {
    const { tables } = store.program;
    const { definitions, problems } = compilePlan(plan, store.quantities, tables);
    const { values } = evaluate(compile([...store.quantities, ...definitions], tables), setting, { tolerances: true });
    // A stage that is not whole yet is told so by its problem; that it has no value would only repeat it.
    const unready = new Set(problems.map(({ stage }) => stage));
    const findings = checkPlan(plan, values).filter(({ stage, code }) => code !== 'no-value' || !unready.has(stage));
    return { values, problems, findings };
  }, [store, plan, setting]);
}

/** Stages in an order in which each follows what feeds it; on a ring the rest keep the order they were drawn in. */
function layoutOfPlan({ stages }: FrequencyPlan) {
  const links = new Map(stages.map(({ id, from }) => [id, from]));
  const order: string[] = [];
  const waiting = new Set(stages.map(({ id }) => id));
  for (let isMoving = true; isMoving;) {
    isMoving = false;
    for (const id of waiting) {
      if (links.get(id)?.some((each) => waiting.has(each)) === true) continue;
      waiting.delete(id);
      order.push(id);
      isMoving = true;
    }
  }
  return layoutOf([...order, ...waiting], links);
}

const worstOf = (findings: readonly Finding[], id: string): Finding['weight'] | null =>
  (['alarm', 'doubt'] as const).find((weight) =>
    findings.some((each) => each.stage === id && each.weight === weight),
  ) ?? null;

type BoxProps = {
  stage: Stage | undefined;
  value: LiveValue | undefined;
  worst: Finding['weight'] | null;
  isChosen: boolean;
  onChoose: () => void;
};

function StageBox({ stage, value, worst, isChosen, onChoose }: BoxProps) {
  if (stage === undefined) return null;
  return (
    <button
      type="button"
      aria-pressed={isChosen}
      className={cx('graph-node', stage.from.length === 0 && 'is-input', isChosen && 'is-chosen')}
      onClick={onChoose}
    >
      <span className="block truncate">{nameOf(stage)}</span>
      <Frequency value={value} />
      <Mark worst={worst} />
    </button>
  );
}

const nameOf = ({ name, kind }: Stage): string => (name.trim() === '' ? stageWords[kind].word : name);

const Frequency = ({ value }: { value: LiveValue | undefined }) =>
  value === undefined || value.value === null ? (
    <span className="figures block truncate text-alarm">no frequency yet</span>
  ) : (
    <span className="figures block truncate font-semibold">{value.text}</span>
  );

function Mark({ worst }: { worst: Finding['weight'] | null }) {
  if (worst === null) return null;
  const isAlarm = worst === 'alarm';
  return (
    <span className={isAlarm ? 'stage-mark text-alarm' : 'stage-mark text-doubt'}>
      <span aria-hidden="true">{isAlarm ? '✕' : '?'}</span>
      <span className="sr-only">{isAlarm ? 'will not work as set' : 'to be looked at'}</span>
    </span>
  );
}

function AddStage({ behind, onAdd }: { behind: Stage | undefined; onAdd: (kind: StageKind) => void }) {
  const [kind, setKind] = useState<StageKind>('input');
  const where = behind === undefined ? '' : ` behind ${nameOf(behind)}`;
  return (
    <>
      <select
        aria-label="Kind of stage"
        className={`${inputLook} w-auto!`}
        value={kind}
        onChange={({ currentTarget }) => setKind(currentTarget.value as StageKind)}
      >
        {(Object.keys(stageWords) as StageKind[]).map((each) => (
          <option key={each} value={each}>
            {stageWords[each].word}
          </option>
        ))}
      </select>
      <Button onClick={() => onAdd(kind)}>{`Add it${where}`}</Button>
    </>
  );
}
