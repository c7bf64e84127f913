import type { ReactNode } from 'react';
import { Link } from 'react-router';
import type { LiveValue, Sensitivity } from '#shared/calc/describe-value.ts';
import { sensitivityWords } from '#shared/calc/sensitivity-words.ts';
import { formatQuantity } from '#shared/units/format-quantity.ts';
import { inSi } from '#shared/units/in-si.ts';
import { StateWord } from '#src/ui/state-word.tsx';
import { filledIn } from './filled-in.ts';
import { type LiveQuantity, useSetting } from './live-values.tsx';
import type { PlacedValue } from './placed-value.ts';

type Props = { live: LiveQuantity; placed: PlacedValue };

/** All there is to say of one value: where it comes from, what was printed, whether that is proved, how far it may be off. */
export function ValueDetails({ live, placed }: Props) {
  const { quantity, value, store } = live;
  useSetting();
  const deeper = store.evaluate({ tolerances: true, sensitivities: true }).values[quantity.symbol];
  return (
    <div className="value-details">
      <h2 className="font-serif text-lead font-semibold">{quantity.label === '' ? quantity.symbol : quantity.label}</h2>
      <dl>
        <Line label="Symbol">
          <code className="figures">{quantity.symbol}</code>, {kindWords[quantity.kind]}
        </Line>
        <ComesFrom live={live} />
        <Line label="As printed">
          <span className="figures">{placed.printed}</span>
        </Line>
        <Line label="As set">
          {value.problem === undefined ? (
            <span className="figures text-signal">{placed.asSet}</span>
          ) : (
            <>
              <StateWord tone="alarm" shape="cross">
                Unavailable
              </StateWord>
              <p className="text-alarm">{value.problem.message}</p>
            </>
          )}
        </Line>
        <InSiUnits text={placed.asSet} />
        <Line label="At home">
          <AtHome live={live} />
        </Line>
        <Bounds quantity={quantity} value={deeper} />
      </dl>
      <Sensitivities of={deeper?.sensitivity} live={live} />
      <WhereDefined quantity={quantity} />
    </div>
  );
}

function ComesFrom({ live: { quantity, store } }: { live: LiveQuantity }) {
  const numbers = filledIn(store.program, quantity.symbol, (symbol) => store.read(symbol)?.text || 'unavailable');
  if (quantity.expression === undefined) return null;
  return (
    <Line label="Comes from">
      <code className="figures block break-words">{quantity.expression}</code>
      {numbers === undefined ? null : <code className="figures block break-words text-pencil">= {numbers}</code>}
    </Line>
  );
}

function Bounds({
  quantity: { limits, unit },
  value,
}: {
  quantity: LiveQuantity['quantity'];
  value: LiveValue | undefined;
}) {
  return (
    <>
      {value?.low === undefined || value.high === undefined ? null : (
        <Line label="With tolerances">
          <span className="figures">{`${formatQuantity(value.low, '')} to ${formatQuantity(value.high, unit)}`}</span>
        </Line>
      )}
      {limits === undefined ? null : (
        <Line label="Limits">
          <span className="figures">{limitsText(limits, unit)}</span>
          {value?.limitsBroken === true ? (
            <StateWord tone="alarm" shape="cross" className="ml-2">
              outside
            </StateWord>
          ) : null}
        </Line>
      )}
    </>
  );
}

const kindWords = { input: 'an input: you set it', constant: 'a constant', derived: 'worked out from others' } as const;

const Line = ({ label, children }: { label: string; children: ReactNode }) => (
  <div className="value-line">
    <dt>{label}</dt>
    <dd>{children}</dd>
  </div>
);

function AtHome({ live: { quantity, store } }: { live: LiveQuantity }) {
  const item = store.proof.items.find(({ symbol }) => symbol === quantity.symbol);
  const home = store.home[quantity.symbol];
  if (item === undefined) return <span className="figures">{home?.text === '' ? 'no value' : home?.text}</span>;
  if (item.agrees) {
    return (
      <StateWord tone="good" shape="tick">
        comes out as printed
      </StateWord>
    );
  }
  return (
    <StateWord tone="alarm" shape="cross">
      {item.computed === ''
        ? (item.problem?.message ?? 'has no value')
        : `comes out as ${item.computed}, not as printed`}
    </StateWord>
  );
}

type SensitivityProps = { of: Record<string, Sensitivity> | undefined; live: LiveQuantity };

function Sensitivities({ of, live: { quantity, store } }: SensitivityProps) {
  const sentences = Object.entries(of ?? {}).flatMap(([symbol, sensitivity]) => {
    const input = store.program.cells[store.program.slots.get(symbol) ?? -1]?.definition;
    const words = input === undefined ? undefined : sensitivityWords(input, quantity, sensitivity);
    return words === undefined ? [] : [{ symbol, words, ppm: sensitivity.ppm }];
  });
  if (sentences.length === 0) return null;
  return (
    <div className="mt-3">
      <h3 className="cell-label">Moves with</h3>
      <ul>
        {sentences.map(({ symbol, words, ppm }) => (
          <li key={symbol}>
            {words}
            {ppm === null ? '.' : `; ${formatQuantity(ppm, '', { significant: 3 })} ppm per ppm.`}
          </li>
        ))}
      </ul>
    </div>
  );
}

/** The same in today's units, where the print has others. */
function InSiUnits({ text }: { text: string }) {
  const modern = inSi(text);
  return modern === undefined || modern === text ? null : (
    <Line label="In SI">
      <span className="figures">{modern}</span>
    </Line>
  );
}

/** The way to the place that the quantity was taken from, with its box on the scan. */
function WhereDefined({ quantity: { pageId, zone } }: Pick<LiveQuantity, 'quantity'>) {
  if (pageId === null || pageId === undefined) return null;
  const boxes = zone === null || zone === undefined ? '' : `?boxes=${zone.join(',')}`;
  return (
    <p className="mt-3">
      <Link to={`/pages/${pageId}/read${boxes}`} className="word-link">
        Where it is printed
      </Link>
    </p>
  );
}

function limitsText({ low, high }: { low?: number | undefined; high?: number | undefined }, unit: string): string {
  if (low === undefined) return `up to ${formatQuantity(high ?? NaN, unit)}`;
  return high === undefined
    ? `from ${formatQuantity(low, unit)}`
    : `${formatQuantity(low, '')} to ${formatQuantity(high, unit)}`;
}
