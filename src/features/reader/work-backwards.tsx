import { useState } from 'react';
import type { Quantity } from '#shared/api/quantities.ts';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import { allDependsOn } from '#shared/calc/program.ts';
import type { Solution } from '#shared/calc/solve.ts';
import { formatQuantity } from '#shared/units/format-quantity.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useSetting } from '#src/blocks/live-value/live-values.tsx';
import { Button } from '#src/ui/button.tsx';
import { Field, Select } from '#src/ui/field.tsx';

type Props = { store: LiveStore; inputs: readonly Quantity[] };

/** From a value that is to hand, a crystal say, to the input that comes nearest to it. */
export function WorkBackwards({ store, inputs }: Props) {
  // Those of the manual first, then the stages of its frequency plan: the crystal may be known by either.
  const all = store.program.cells.map(({ definition }) => definition);
  const held = all.filter(({ kind, symbol }) => kind === 'derived' && inputsBehind(store, symbol, inputs).length > 0);
  const [symbol, setSymbol] = useState(
    held.find(({ label }) => /crystal/i.test(label))?.symbol ?? held[0]?.symbol ?? '',
  );
  const [text, setText] = useState('');
  const choices = inputsBehind(store, symbol, inputs);
  const [wished, setWished] = useState('');
  const solveFor = choices.find((each) => each.symbol === wished) ?? choices[0];
  const quantity = held.find((each) => each.symbol === symbol);
  useSetting();
  if (held.length === 0 || quantity === undefined || solveFor === undefined) return null;
  return (
    <div>
      <h2 className="font-serif text-lead font-semibold">Work backwards</h2>
      <p className="mb-2 text-pencil">Type the value that you have; the nearest setting is worked out.</p>
      <div className="flex flex-wrap gap-x-3">
        <Select
          label="I have a value for"
          frame="flex-1 basis-48"
          value={symbol}
          onChange={({ currentTarget }) => setSymbol(currentTarget.value)}
        >
          {held.map((each) => (
            <option key={each.symbol} value={each.symbol}>
              {each.label === '' ? each.symbol : each.label}
            </option>
          ))}
        </Select>
        <Field
          label="It is"
          frame="flex-1 basis-32"
          className="figures"
          value={text}
          hint={`In ${quantity.unit === '' ? 'plain numbers' : quantity.unit}, or with a unit`}
          onChange={({ currentTarget }) => setText(currentTarget.value)}
        />
        {choices.length < 2 ? null : (
          <Select
            label="Change"
            frame="flex-1 basis-32"
            value={solveFor.symbol}
            onChange={({ currentTarget }) => setWished(currentTarget.value)}
          >
            {choices.map((each) => (
              <option key={each.symbol} value={each.symbol}>
                {each.label}
              </option>
            ))}
          </Select>
        )}
      </div>
      {text.trim() === '' ? null : <Found store={store} quantity={quantity} solveFor={solveFor} value={text} />}
    </div>
  );
}

const inputsBehind = (store: LiveStore, symbol: string, inputs: readonly Quantity[]): Quantity[] => {
  const behind = allDependsOn(store.program, symbol);
  return inputs.filter((each) => behind.includes(each.symbol));
};

type FoundProps = { store: LiveStore; quantity: QuantityDefinition; solveFor: Quantity; value: string };

function Found({ store, quantity, solveFor, value }: FoundProps) {
  const { pinned, problems } = store.evaluate({ pin: { symbol: quantity.symbol, value, solveFor: solveFor.symbol } });
  if (pinned === undefined) {
    return (
      <p role="status" className="text-alarm">
        {problems[0]?.message ?? 'No setting gives this value.'}
      </p>
    );
  }
  const input = formatQuantity(pinned.value, solveFor.unit);
  return (
    <div role="status">
      <p>
        {pinned.exact ? '' : 'Nearest: '}
        <strong className="font-semibold">{`${solveFor.label} ${input}`}</strong>, which needs{' '}
        <span className="figures">{formatQuantity(pinned.achieved, quantity.unit)}</span>
        {pinned.exact ? ', just that.' : `; yours is off by ${offBy(pinned, quantity.unit)}.`}
      </p>
      <Button className="mt-2" onClick={() => store.set(solveFor.symbol, pinned.value)}>
        {`Take ${solveFor.label.toLowerCase()} ${input}`}
      </Button>
    </div>
  );
}

/** The miss in the held quantity's unit and in parts per million of what is needed. */
function offBy({ error, achieved }: Solution, unit: string): string {
  const ppm = achieved === 0 ? '' : ` (${formatQuantity((-error / achieved) * 1e6, '', { significant: 3 })} ppm)`;
  return `${formatQuantity(-error, unit, { significant: 4 })}${ppm}`;
}
