import { useState } from 'react';
import { nameOvertone } from '#shared/crystal/blank.ts';
import { type CrystalConclusion, identifyCrystal } from '#shared/crystal/identify.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useLiveStore } from '#src/blocks/live-value/live-values.tsx';
import { formatQuantity } from '#shared/units/format-quantity.ts';
import { Field, Select } from '#src/ui/field.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { SectionHead } from '#src/ui/screen.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { CrystalBudget } from './crystal-budget.tsx';
import { evidenceFrom, nothingTyped, type Typed } from './crystal-evidence.ts';

/** A crystal at hand: what it is, what it would do in this set, and how far its errors reach. */
export function Crystals() {
  const store = useLiveStore();
  if (store === null) return <Pending what="Fetching the values …" />;
  return (
    <>
      <AtHand store={store} />
      <CrystalBudget store={store} />
    </>
  );
}

type FieldGiven = { name: keyof Typed; label: string; hint?: string };

const fields: readonly FieldGiven[] = [
  { name: 'marked', label: 'Marked frequency', hint: 'As on the can; MHz unless you write another unit' },
  { name: 'series', label: 'Series resonance', hint: 'Where it conducts best' },
  { name: 'parallel', label: 'Parallel resonance', hint: 'Where it conducts least' },
  { name: 'nearThird', label: 'Response near a third', hint: 'Its frequency, or “none”' },
  { name: 'nearFifth', label: 'Response near a fifth', hint: 'Its frequency, or “none”' },
  { name: 'testCapacitor', label: 'Test capacitor in series', hint: 'pF unless you write another unit' },
  { name: 'testFrequency', label: 'Frequency with it' },
];

function AtHand({ store }: { store: LiveStore }) {
  const [typed, setTyped] = useState(nothingTyped);
  const { evidence, faults } = evidenceFrom(typed);
  const hasEvidence = Object.keys(evidence).some((name) => name !== 'markedOvertone');
  return (
    <section aria-label="A crystal at hand" className="mb-8">
      <SectionHead title="A crystal at hand" />
      <p className="mb-3 max-w-[70ch] text-pencil">
        Fill in what is marked on it and what you have measured; leave the rest empty. What can be concluded is said
        with its reasons, and what is still open.
      </p>
      <div className="grid gap-x-4 sm:grid-cols-2 lg:grid-cols-4">
        {fields.map(({ name, label, hint }) => (
          <Field
            key={name}
            label={label}
            hint={hint}
            className="figures"
            error={faults[name]}
            value={typed[name]}
            onChange={({ currentTarget }) => setTyped({ ...typed, [name]: currentTarget.value })}
          />
        ))}
        <Select
          label="Marked as"
          value={typed.markedOvertone}
          onChange={({ currentTarget }) => setTyped({ ...typed, markedOvertone: currentTarget.value })}
        >
          <option value="">not marked</option>
          {[1, 3, 5, 7].map((overtone) => (
            <option key={overtone} value={overtone}>
              {nameOvertone(overtone)}
            </option>
          ))}
        </Select>
      </div>
      {hasEvidence ? (
        <div role="status" className="grid gap-x-8 gap-y-4 md:grid-cols-2">
          <Conclusion conclusion={identifyCrystal(evidence)} />
          <InThisSet store={store} hz={evidence.markedHz ?? evidence.seriesHz} />
        </div>
      ) : null}
    </section>
  );
}

function Conclusion({ conclusion }: { conclusion: CrystalConclusion }) {
  const { reasons, open } = conclusion;
  const facts = factsOf(conclusion);
  return (
    <div>
      <h3 className="font-semibold">What it is</h3>
      {facts.length === 0 ? <p className="text-pencil">Nothing can be concluded yet.</p> : null}
      <dl>
        {facts.map(([label, value]) => (
          <div key={label} className="grid grid-cols-[9rem_minmax(0,1fr)] gap-x-3">
            <dt className="text-pencil">{label}</dt>
            <dd className="figures">{value}</dd>
          </div>
        ))}
      </dl>
      <ul className="mt-2 grid gap-1">
        {reasons.map((reason) => (
          <li key={reason}>
            <StateWord tone="ink" shape="dot">
              {reason}
            </StateWord>
          </li>
        ))}
        {open.map((each) => (
          <li key={each}>
            <StateWord tone="doubt" shape="question">
              {each}
            </StateWord>
          </li>
        ))}
      </ul>
    </div>
  );
}

const inPicofarads = (farads: number): string => formatQuantity(farads * 1e12, 'pF', { significant: 3 });

function factsOf({ overtone, operation, load, motional }: CrystalConclusion): [string, string][] {
  const facts: [string, string][] = [];
  if (overtone !== undefined) facts.push(['Mode', nameOvertone(overtone)]);
  if (operation !== undefined)
    facts.push(['Marked for', operation === 'series' ? 'series resonance' : 'a load capacitance']);
  if (load !== undefined)
    facts.push([
      'Load capacitance',
      `${inPicofarads(load.likely)} (${inPicofarads(load.low)} to ${inPicofarads(load.high)})`,
    ]);
  if (motional !== undefined) {
    facts.push(['Motional C1', formatQuantity(motional.c1 * 1e15, 'fF', { significant: 4 })]);
    facts.push(['Static C0', inPicofarads(motional.c0)]);
    facts.push(['Motional L1', formatQuantity(motional.l1 * 1e3, 'mH', { significant: 4 })]);
  }
  return facts;
}

/** Each crystal of the manual, held at this frequency: what channel, or other input, it would serve. */
function InThisSet({ store, hz }: { store: LiveStore; hz: number | undefined }) {
  const crystals = store.quantities.filter(({ kind, label }) => kind === 'derived' && /crystal/i.test(label));
  const input = store.quantities.find(({ kind }) => kind === 'input');
  if (hz === undefined || crystals.length === 0 || input === undefined) return null;
  const found = crystals.flatMap((crystal) => {
    const { pinned } = store.evaluate({
      pin: { symbol: crystal.symbol, value: `${hz / 1e6} MHz`, solveFor: input.symbol },
    });
    return pinned === undefined ? [] : [{ crystal, pinned }];
  });
  return (
    <div>
      <h3 className="font-semibold">In this set</h3>
      {found.length === 0 ? (
        <p className="text-pencil">{`No ${input.label.toLowerCase()} moves a crystal of this set.`}</p>
      ) : null}
      <ul className="grid gap-1">
        {found.map(({ crystal, pinned }) => (
          <li key={crystal.symbol}>
            {`As ${crystal.label} it is nearest to ${input.label.toLowerCase()} `}
            <span className="figures font-semibold">{formatQuantity(pinned.value, input.unit)}</span>
            {', which needs '}
            <span className="figures">{formatQuantity(pinned.achieved, crystal.unit)}</span>
            {pinned.exact ? ', just that.' : `; this one is ${ppmOff(pinned)} off.`}
          </li>
        ))}
      </ul>
    </div>
  );
}

const ppmOff = ({ error, achieved }: { error: number; achieved: number }): string =>
  `${formatQuantity((-error / achieved) * 1e6, '', { significant: 3 })} ppm`;
