import type { ReactNode } from 'react';
import { feedsOf } from '#shared/plan/define-stage.ts';
import type { Finding } from '#shared/plan/finding.ts';
import type { FrequencyPlan, Stage, StageKind } from '#shared/plan/plan.ts';
import { Button } from '#src/ui/button.tsx';
import { Field, Select } from '#src/ui/field.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { asKind, stageWords, withFeeds } from './plan-edits.ts';

type Props = {
  plan: FrequencyPlan;
  stage: Stage;
  mayEdit: boolean;
  /** What is wrong with the stage, and what was found of it at the present setting. */
  problems: readonly string[];
  findings: readonly Finding[];
  onChange: (stage: Stage) => void;
  onRemove: () => void;
};

/** One stage of the plan: what it is, what feeds it, what it does, and what was found of it. */
export function StageForm({ plan, stage, mayEdit, problems, findings, onChange, onRemove }: Props) {
  const title = stage.name.trim() === '' ? stageWords[stage.kind].word : stage.name;
  return (
    <section aria-label="This stage" className="border border-rule bg-leaf p-3">
      <h3 className="mb-2 font-serif text-lead font-semibold">{title}</h3>
      <Findings problems={problems} findings={findings} />
      {mayEdit ? (
        <>
          <Field
            label="Name"
            value={stage.name}
            maxLength={80}
            onChange={({ currentTarget }) => onChange({ ...stage, name: currentTarget.value })}
          />
          <Select
            label="Kind"
            hint={stageWords[stage.kind].says}
            value={stage.kind}
            onChange={({ currentTarget }) => onChange(asKind(stage, currentTarget.value as StageKind))}
          >
            {(Object.keys(stageWords) as StageKind[]).map((kind) => (
              <option key={kind} value={kind}>
                {stageWords[kind].word}
              </option>
            ))}
          </Select>
          <Feeds plan={plan} stage={stage} onChange={onChange} />
          <Parameters stage={stage} onChange={onChange} />
          <Limits stage={stage} onChange={onChange} />
          <Button look="quiet" onClick={onRemove}>
            Take this stage away
          </Button>
        </>
      ) : null}
    </section>
  );
}

const marks = {
  alarm: { tone: 'alarm', shape: 'cross' },
  doubt: { tone: 'doubt', shape: 'question' },
  note: { tone: 'ink', shape: 'dot' },
  good: { tone: 'good', shape: 'tick' },
} as const;

function Findings({ problems, findings }: Pick<Props, 'problems' | 'findings'>) {
  if (problems.length + findings.length === 0) return null;
  return (
    <ul className="mb-3 grid gap-1 text-small">
      {problems.map((problem) => (
        <li key={problem}>
          <StateWord {...marks.alarm}>{withoutName(problem)}</StateWord>
        </li>
      ))}
      {findings.map(({ code, weight, message }) => (
        <li key={`${code} ${message}`}>
          <StateWord {...marks[weight]}>{withoutName(message)}</StateWord>
        </li>
      ))}
    </ul>
  );
}

/** The stage's own name ahead of the colon only repeats the heading. */
function withoutName(message: string): string {
  const says = message.replace(/^[A-Z][\w -]* "[^"]*":? /, '');
  return says.charAt(0).toUpperCase() + says.slice(1);
}

type EditProps = { stage: Stage; onChange: (stage: Stage) => void };

function Feeds({ plan, stage, onChange }: EditProps & { plan: FrequencyPlan }) {
  const { names, least } = feedsOf[stage.kind];
  return names.map((name, at) => (
    <Select
      key={name}
      label={`${name.charAt(0).toUpperCase()}${name.slice(1)} from`}
      value={stage.from[at] ?? ''}
      onChange={({ currentTarget }) => {
        const from = [...stage.from];
        from[at] = currentTarget.value;
        onChange(
          withFeeds(
            stage,
            from.filter((each) => each !== ''),
          ),
        );
      }}
    >
      <option value="">{at < least ? 'not connected' : 'none'}</option>
      {plan.stages
        .filter(({ id }) => id !== stage.id)
        .map(({ id, name: other, kind }) => (
          <option key={id} value={id}>
            {other.trim() === '' ? `${stageWords[kind].word} (${id})` : other}
          </option>
        ))}
    </Select>
  ));
}

/** A parameter of a stage that is text; '' where it has none of that name. */
function textIn(stage: Stage, name: string): string {
  const value = (stage as Record<string, unknown>)[name];
  return typeof value === 'string' ? value : '';
}

const formulaHint = 'A number with its unit, or a formula of this manual’s values';

function Parameters({ stage, onChange }: EditProps): ReactNode {
  const text = (name: string, label: string, hint?: string): ReactNode => (
    <Field
      key={name}
      label={label}
      hint={hint}
      className="figures"
      value={textIn(stage, name)}
      onChange={({ currentTarget }) => onChange({ ...stage, [name]: currentTarget.value })}
    />
  );
  switch (stage.kind) {
    case 'input':
    case 'crystal':
    case 'vcxo':
      return [text('frequency', 'Frequency', formulaHint), text('tolerance', 'Tolerance', '±20 ppm, ±0.002 %, ±5 kc')];
    case 'multiplier':
      return text('factor', 'Times', 'A number, or a formula');
    case 'divider':
      return text('divisor', 'Divided by', 'A number, or a formula');
    case 'synthesiser':
      return [text('n', 'Count N', '1250, or 120 + 1/25'), text('r', 'Reference divisor R')];
    case 'loop':
      return [
        text('n', 'Count N', '1250, or 120 + 1/25'),
        text('r', 'Reference divisor R'),
        <OneOf
          key="side"
          stage={stage}
          name="side"
          label="Beside the offset"
          of={['above', 'below']}
          onChange={onChange}
        />,
      ];
    case 'mixer':
      return [
        <OneOf
          key="product"
          stage={stage}
          name="product"
          label="Gives the"
          of={['difference', 'sum']}
          onChange={onChange}
        />,
        <OneOf
          key="injection"
          stage={stage}
          name="injection"
          label="Injection lies"
          of={['low', 'high']}
          onChange={onChange}
        />,
      ];
    default:
      return null;
  }
}

type OneOfProps = EditProps & { name: string; label: string; of: readonly string[] };

const OneOf = ({ stage, name, label, of, onChange }: OneOfProps) => (
  <Select
    label={label}
    value={textIn(stage, name)}
    onChange={({ currentTarget }) => onChange({ ...stage, [name]: currentTarget.value })}
  >
    {of.map((each) => (
      <option key={each} value={each}>
        {each}
      </option>
    ))}
  </Select>
);

function Limits({ stage, onChange }: EditProps) {
  const change = (edge: 'low' | 'high', value: string): void => {
    const { [edge]: _old, ...other } = stage.limits ?? {};
    const limits = value.trim() === '' ? other : { ...other, [edge]: value };
    const { limits: _limits, ...bare } = stage;
    onChange(Object.keys(limits).length === 0 ? bare : { ...bare, limits });
  };
  const word = stage.kind === 'filter' ? 'Passes' : 'Works';
  return (
    <div className="grid grid-cols-2 gap-x-3">
      {(['low', 'high'] as const).map((edge) => (
        <Field
          key={edge}
          label={`${word} ${edge === 'low' ? 'from' : 'to'}`}
          className="figures"
          value={stage.limits?.[edge] ?? ''}
          onChange={({ currentTarget }) => change(edge, currentTarget.value)}
        />
      ))}
    </div>
  );
}
