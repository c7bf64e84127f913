import { useState } from 'react';
import { type BudgetPart, errorAtCarrier, errorBudget } from '#shared/crystal/budget.ts';
import { toBase } from '#shared/units/convert.ts';
import { findUnit } from '#shared/units/definitions.ts';
import { formatQuantity } from '#shared/units/format-quantity.ts';
import type { Quantity } from '#shared/api/quantities.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useSetting } from '#src/blocks/live-value/live-values.tsx';
import { Field, Select } from '#src/ui/field.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { SectionHead } from '#src/ui/screen.tsx';

const parts: readonly { part: BudgetPart['part']; label: string; start: string }[] = [
  { part: 'making', label: 'Making', start: '10' },
  { part: 'temperature', label: 'Temperature', start: '20' },
  { part: 'ageing', label: 'Ageing', start: '5' },
  { part: 'pulling', label: 'Pulling by the load', start: '0' },
];

/** How the errors of a crystal reach the carrier: all against it at once, and as independent parts add up. */
export function CrystalBudget({ store }: { store: LiveStore }) {
  useSetting();
  const [typed, setTyped] = useState<Record<string, string>>(() =>
    Object.fromEntries(parts.map(({ part, start }) => [part, start])),
  );
  const frequencies = store.quantities.filter((each) => hertzOf(store, each.symbol) !== null);
  const [crystal, setCrystal] = useState(symbolLike(frequencies, /crystal/i));
  const [carrier, setCarrier] = useState(symbolLike(frequencies, /channel freq|carrier/i));
  const [factor, setFactor] = useState('9');
  if (frequencies.length === 0) return null;
  const budget = errorBudget(parts.map(({ part }) => ({ part, ppm: Number(typed[part]) || 0 })));
  const [crystalHz, carrierHz] = [hertzOf(store, crystal), hertzOf(store, carrier)];
  const times = Number(factor);
  return (
    <section aria-label="Error budget">
      <SectionHead title="Error budget" />
      <p className="mb-3 max-w-[70ch] text-pencil">
        In parts per million, either way. The root of the sum of squares holds only where the parts have nothing to do
        with one another.
      </p>
      <div className="grid gap-x-4 sm:grid-cols-2 lg:grid-cols-4">
        {parts.map(({ part, label }) => (
          <Field
            key={part}
            label={`${label} (ppm)`}
            inputMode="decimal"
            className="figures"
            value={typed[part]}
            error={Number.isNaN(Number(typed[part])) ? 'A number.' : undefined}
            onChange={({ currentTarget }) => setTyped({ ...typed, [part]: currentTarget.value })}
          />
        ))}
        <OneOf label="Crystal" of={frequencies} value={crystal} onChange={setCrystal} />
        <Field
          label="Multiplied by"
          inputMode="decimal"
          className="figures"
          value={factor}
          error={times > 0 ? undefined : 'A number above zero.'}
          onChange={({ currentTarget }) => setFactor(currentTarget.value)}
        />
        <OneOf label="Carrier" of={frequencies} value={carrier} onChange={setCarrier} />
      </div>
      {crystalHz === null || carrierHz === null || !(times > 0) ? null : (
        <Reach
          budget={budget}
          at={errorAtCarrier(budget, { crystalHz, factor: times, carrierHz })}
          crystalHz={crystalHz}
        />
      )}
    </section>
  );
}

type Budget = ReturnType<typeof errorBudget>;
type AtCarrier = ReturnType<typeof errorAtCarrier>;

function Reach({ budget, at, crystalHz }: { budget: Budget; at: AtCarrier; crystalHz: number }) {
  const rows: readonly [string, number, number, number][] = [
    ['All against it at once', budget.worstPpm, at.worstHz, at.worstPpm],
    ['Root of the sum of squares', budget.rssPpm, at.rssHz, at.rssPpm],
  ];
  const hertz = (value: number): string => formatQuantity(value, 'Hz', { significant: 4 });
  const ppm = (value: number): string => `${formatQuantity(value, '', { significant: 3 })} ppm`;
  const head = (
    <>
      <Th>Reckoned</Th>
      <Th>Of the crystal</Th>
      <Th>At the crystal</Th>
      <Th>At the carrier</Th>
      <Th>Of the carrier</Th>
    </>
  );
  return (
    <RuledTable caption="Error budget" head={head}>
      {rows.map(([label, crystalPpm, carrierHz, carrierPpm]) => (
        <tr key={label}>
          <Td>{label}</Td>
          <Td className="figures">±{ppm(crystalPpm)}</Td>
          <Td className="figures">±{hertz(crystalPpm * 1e-6 * crystalHz)}</Td>
          <Td className="figures font-semibold">±{hertz(carrierHz)}</Td>
          <Td className="figures">±{ppm(carrierPpm)}</Td>
        </tr>
      ))}
    </RuledTable>
  );
}

type OneOfProps = { label: string; of: readonly Quantity[]; value: string; onChange: (symbol: string) => void };

const OneOf = ({ label, of, value, onChange }: OneOfProps) => (
  <Select label={label} value={value} onChange={({ currentTarget }) => onChange(currentTarget.value)}>
    {of.map((each) => (
      <option key={each.symbol} value={each.symbol}>
        {each.label || each.symbol}
      </option>
    ))}
  </Select>
);

const symbolLike = (of: readonly Quantity[], words: RegExp): string =>
  (of.find(({ label }) => words.test(label)) ?? of[0])?.symbol ?? '';

/** The value of a quantity now, if it is a frequency. */
function hertzOf(store: LiveStore, symbol: string): number | null {
  const value = store.read(symbol);
  const unit = findUnit(value?.unit ?? '');
  if (value === undefined || value.value === null || !unit.ok || unit.value.dimension !== 'frequency') return null;
  return toBase(value.value, unit.value);
}
