import { useMutation, useQueryClient } from '@tanstack/react-query';
import { type FormEvent, useState } from 'react';
import { type Quantity, type QuantityInput, quantityInput } from '#shared/api/quantities.ts';
import { proposeName } from '#shared/calc/propose-name.ts';
import { addQuantity } from '#src/api/quantities.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Field, Select } from '#src/ui/field.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import type { PrintedNumber } from './printed-number.ts';
import { type QuantityDraft, inputFrom, printedUnit } from './quantity-from-print.ts';
import { type Trial, tryQuantity } from './propose-quantity.ts';
import { relationsAmong } from './propose-relations.ts';

type Props = {
  store: LiveStore;
  manualId: string;
  pageId: string;
  found: PrintedNumber;
  onMade: (quantity: Quantity) => void;
};
type QuantityKind = QuantityInput['kind'];

const kinds: readonly { value: QuantityKind; label: string }[] = [
  { value: 'derived', label: 'Worked out from others' },
  { value: 'input', label: 'An input, set at the bench' },
  { value: 'constant', label: 'A constant' },
];

/** A new quantity for a printed number. Whether it gives the printed digits is seen while it is typed. */
export function NewQuantityForm({ store, manualId, pageId, found, onMade }: Props) {
  const client = useQueryClient();
  const add = useMutation(addQuantity(client, manualId));
  const [draft, setDraft] = useState<QuantityDraft>(() => ({
    ...proposeName(
      found.before,
      store.quantities.map(({ symbol }) => symbol),
    ),
    kind: 'derived',
    unit: printedUnit(found),
    expression: relationsAmong(store, [found])[0] ?? '',
  }));
  const change = (part: Partial<QuantityDraft>): void => setDraft((before) => ({ ...before, ...part }));
  const input = inputFrom(draft, found, pageId);
  const checked = quantityInput.safeParse(input);
  const issueAt = (path: string): string | undefined =>
    checked.success ? undefined : checked.error.issues.find((issue) => issue.path.join('.') === path)?.message;
  const taken = store.quantities.some(({ symbol }) => symbol === draft.symbol)
    ? 'Taken by another quantity of this manual.'
    : undefined;
  const trial: Trial = checked.success && taken === undefined ? tryQuantity(store, input) : { state: 'incomplete' };
  const onSubmit = (event: FormEvent): void => {
    event.preventDefault();
    if (checked.success) add.mutate(input, { onSuccess: onMade });
  };
  return (
    <form onSubmit={onSubmit} aria-label="New quantity">
      <Field
        label="Label"
        value={draft.label}
        maxLength={200}
        onChange={({ currentTarget }) => change({ label: currentTarget.value })}
      />
      <Field
        label="Symbol"
        className="figures"
        value={draft.symbol}
        maxLength={60}
        error={taken ?? issueAt('symbol')}
        onChange={({ currentTarget }) => change({ symbol: currentTarget.value })}
      />
      <Select
        label="It is"
        value={draft.kind}
        onChange={({ currentTarget }) => change({ kind: currentTarget.value as QuantityKind })}
      >
        {kinds.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </Select>
      <Field
        label="Unit"
        className="figures"
        value={draft.unit}
        maxLength={20}
        hint="As printed; leave it empty for a plain number"
        error={issueAt('unit')}
        onChange={({ currentTarget }) => change({ unit: currentTarget.value })}
      />
      {draft.kind === 'derived' ? (
        <ExpressionField store={store} value={draft.expression} onChange={(expression) => change({ expression })} />
      ) : null}
      <TrialSays trial={trial} expression={draft.expression} printed={found.text} />
      {add.error === null ? null : (
        <p role="alert" className="font-semibold text-alarm">
          {saidBy(add.error)}
        </p>
      )}
      <Button
        type="submit"
        look="main"
        disabled={trial.state !== 'comes-out'}
        busy={add.isPending && 'Making it live …'}
      >
        Make it live
      </Button>
    </form>
  );
}

const symbolsShown = 6;

type ExpressionProps = { store: LiveStore; value: string; onChange: (text: string) => void };

function ExpressionField({ store: { quantities }, value, onChange }: ExpressionProps) {
  const symbols = quantities.slice(0, symbolsShown).map(({ symbol }) => symbol);
  return (
    <Field
      label="Expression"
      className="figures"
      value={value}
      maxLength={2000}
      autoComplete="off"
      spellCheck={false}
      hint={`Of ${symbols.join(', ')}${quantities.length > symbolsShown ? ' …' : ''}`}
      onChange={({ currentTarget }) => onChange(currentTarget.value)}
    />
  );
}

function TrialSays({ trial, expression, printed }: { trial: Trial; expression: string; printed: string }) {
  return (
    <div role="status" className="mb-3 min-h-6">
      {trial.state === 'problem' ? (
        <>
          <StateWord tone="alarm" shape="cross">
            {trial.message}
          </StateWord>
          {trial.start === undefined || trial.end === undefined ? null : (
            <code className="figures mt-1 block break-words">
              {expression.slice(0, trial.start)}
              <mark className="border-b-2 border-alarm bg-alarm-wash!">
                {expression.slice(trial.start, Math.max(trial.end, trial.start + 1)) || ' '}
              </mark>
              {expression.slice(Math.max(trial.end, trial.start + 1))}
            </code>
          )}
        </>
      ) : null}
      {trial.state === 'comes-out' && trial.agrees ? (
        <StateWord tone="good" shape="tick">
          {`At home: ${trial.text}, as printed`}
        </StateWord>
      ) : null}
      {trial.state === 'comes-out' && !trial.agrees ? (
        <StateWord tone="alarm" shape="cross">
          {`At home it comes to ${trial.text}; printed is ${printed}`}
        </StateWord>
      ) : null}
    </div>
  );
}
