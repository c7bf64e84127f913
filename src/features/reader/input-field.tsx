import { type KeyboardEvent, useId, useState } from 'react';
import type { Quantity } from '#shared/api/quantities.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useSetting, useValue } from '#src/blocks/live-value/live-values.tsx';
import { Button } from '#src/ui/button.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { type InputKeys, inputKeys, nextKey } from './input-keys.ts';

type Props = { input: Quantity; store: LiveStore };

/** One input of the manual: a number in its unit, or a text that brings a unit of its own. */
export function InputField({ input, store }: Props) {
  const { symbol, label, unit, integer = false } = input;
  const id = useId();
  const { text, problem, take, step } = useInput(store, symbol);
  const keys = inputKeys(store.program, symbol);
  const onKeyDown = (event: KeyboardEvent): void => {
    const by = event.key === 'ArrowUp' ? 1 : event.key === 'ArrowDown' ? -1 : 0;
    if (!integer || by === 0) return;
    event.preventDefault();
    step(by);
  };
  return (
    <div className="setting-input">
      <label htmlFor={id} className="cell-label">
        {label}
      </label>
      <div className="setting-field">
        <input
          id={id}
          className={`${inputLook} figures`}
          inputMode={integer ? 'numeric' : 'decimal'}
          autoComplete="off"
          list={keys === null ? undefined : `${id}-keys`}
          value={text}
          aria-invalid={problem !== undefined || undefined}
          aria-describedby={`${id}-note`}
          onChange={({ currentTarget }) => take(currentTarget.value)}
          onKeyDown={onKeyDown}
        />
        {unit === '' ? null : <span className="font-light text-pencil">{unit}</span>}
        {integer ? (
          <>
            <Button aria-label={`${label} down`} onClick={() => step(-1)}>
              Down
            </Button>
            <Button aria-label={`${label} up`} onClick={() => step(1)}>
              Up
            </Button>
          </>
        ) : null}
      </div>
      {keys === null ? null : <Keys id={`${id}-keys`} keys={keys} />}
      <p id={`${id}-note`} className="text-small text-pencil">
        {noteOn(store.home[symbol]?.text, keys)}
      </p>
      {problem === undefined ? null : (
        <p role="alert" className="text-small font-semibold text-alarm">
          {problem}
        </p>
      )}
    </div>
  );
}

const noteOn = (home: string | undefined, keys: InputKeys | null): string =>
  `${home === undefined || home === '' ? 'It has no home value' : `Home: ${home}`}${keys === null ? '' : `. May be ${keys.words}.`}`;

function useInput(store: LiveStore, symbol: string) {
  const given = useSetting()[symbol];
  const value = useValue(symbol);
  const shown = String(given ?? store.home[symbol]?.value ?? '');
  // What is being typed is kept as typed ("10." on the way to "10.7"), as long as it means what is set.
  const [typed, setTyped] = useState(shown);
  const take = (next: string): void => {
    setTyped(next);
    store.set(symbol, asInput(next));
  };
  const step = (by: 1 | -1): void => {
    const keys = inputKeys(store.program, symbol);
    const from = Number.isFinite(Number(shown)) ? Number(shown) : 0;
    const next = keys === null ? from + by : nextKey(keys, from, by);
    if (next !== undefined) take(String(next));
  };
  return {
    text: sameInput(typed, shown) ? typed : shown,
    problem: value?.problem?.message ?? problemBehind(store, symbol),
    take,
    step,
  };
}

const Keys = ({ id, keys: { keys } }: { id: string; keys: InputKeys }) => (
  <datalist id={id}>
    {keys.map((key) => (
      <option key={key} value={key} />
    ))}
  </datalist>
);

const asInput = (text: string): number | string =>
  text.trim() !== '' && Number.isFinite(Number(text)) ? Number(text) : text;
const sameInput = (one: string, other: string): boolean => String(asInput(one)) === String(asInput(other));

/** An input may be a fine number and still lead nowhere: a channel that is not in the table. */
function problemBehind(store: LiveStore, symbol: string): string | undefined {
  const cell = store.program.cells[store.program.slots.get(symbol) ?? -1];
  for (const slot of cell?.dependants ?? []) {
    const problem = store.read(store.program.cells[slot]?.definition.symbol ?? '')?.problem;
    if (problem !== undefined && problem.code !== 'depends-on-unavailable') return problem.message;
  }
  return undefined;
}
