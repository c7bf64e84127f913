import { useEffect, useId, useMemo, useState } from 'react';
import {
  unitStyles,
  unitStyleWords,
  useLiveStore,
  useSetting,
  useUnitStyle,
  useValueView,
  valueViewWords,
  valueViews,
} from '#src/blocks/live-value/live-values.tsx';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useSettingWords } from '#src/blocks/live-value/setting-words.ts';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { ToggleGroup } from '#src/ui/toggle-group.tsx';
import { InputField } from './input-field.tsx';
import { SavedSettings } from './saved-settings.tsx';
import { summaryOf } from './setting-summary.ts';
import { SummaryTable } from './summary-table.tsx';
import { WorkBackwards } from './work-backwards.tsx';
import './setting-bar.css';

/** The unit's channel and whatever else can be set, and what follows from it. Folded, it still says where things stand. */
export function SettingBar({ manualId, startsOpen }: { manualId: string; startsOpen: boolean }) {
  const store = useLiveStore();
  if (store === null || store.quantities.length === 0) return null;
  return <Bar manualId={manualId} store={store} startsOpen={startsOpen} />;
}

function Bar({ manualId, store, startsOpen }: { manualId: string; store: LiveStore; startsOpen: boolean }) {
  const setting = useSetting();
  const [isOpen, setOpen] = useState(startsOpen);
  const [isDetailed, setDetailed] = useState(false);
  const id = useId();
  const inputs = store.quantities.filter(({ kind }) => kind === 'input');
  // Once the typing rests: it reads every value of the manual.
  const later = useRested(setting);
  // eslint-disable-next-line react-hooks/exhaustive-deps -- what the store reads follows from the setting
  const summary = useMemo(() => summaryOf(store), [store, later]);
  const isHome = Object.keys(setting).length === 0;
  return (
    <section aria-label="Setting" className="setting-bar">
      <div className="setting-line">
        <button
          type="button"
          className="setting-fold screen-only"
          aria-expanded={isOpen}
          aria-controls={id}
          onClick={() => setOpen(!isOpen)}
        >
          Setting
        </button>
        <strong className="font-semibold">{useSettingWords(manualId)}</strong>
        <Standing summary={summary} />
        <ValueViewChoice />
      </div>
      <div id={id} hidden={!isOpen} className="setting-sheet screen-only">
        <div className="setting-inputs">
          {inputs.map((input) => (
            <InputField key={input.symbol} input={input} store={store} />
          ))}
          <div className="setting-deeds">
            <Button disabled={isHome} onClick={() => store.backToHome()}>
              Back to home
            </Button>
            <SavedSettings manualId={manualId} store={store} />
            <Button aria-expanded={isDetailed} onClick={() => setDetailed(!isDetailed)}>
              {isDetailed ? 'Put the values away' : 'Values and working backwards'}
            </Button>
          </div>
        </div>
        {isDetailed ? (
          <div className="setting-details">
            <SummaryTable summary={summary} />
            <WorkBackwards store={store} inputs={inputs} />
          </div>
        ) : null}
        <p className="mt-2 text-small text-pencil">
          Worked-out values are an aid; they authorise nothing. Mind high voltage and stored charge. Transmitting needs
          a licence; airworthy and safety-of-life equipment a licensed release.
        </p>
      </div>
    </section>
  );
}

function Standing({ summary: { moved, outside, missing, disagreeing } }: { summary: ReturnType<typeof summaryOf> }) {
  return (
    <div role="status" className="setting-standing">
      <span>
        {moved === 0
          ? `${missing === 0 ? 'every value' : 'the others'} as printed`
          : `${counted(moved, 'value')} off the print`}
      </span>
      {missing === 0 ? null : (
        <StateWord tone="alarm" shape="cross">
          {missing} unavailable
        </StateWord>
      )}
      {outside === 0 ? null : (
        <StateWord tone="alarm" shape="cross">
          {outside} outside limits
        </StateWord>
      )}
      {disagreeing === 0 ? (
        <StateWord tone="good" shape="tick">
          proof holds
        </StateWord>
      ) : (
        <StateWord tone="alarm" shape="cross">
          proof: {disagreeing} {disagreeing === 1 ? 'disagrees' : 'disagree'}
        </StateWord>
      )}
    </div>
  );
}

function ValueViewChoice() {
  const [view, setView] = useValueView();
  const [units, setUnits] = useUnitStyle();
  return (
    <>
      <ToggleGroup
        label="Units of live values"
        className="screen-only"
        value={units}
        onValueChange={setUnits}
        choices={unitStyles.map((value) => ({ value, label: unitStyleWords[value] }))}
      />
      <ToggleGroup
        label="How live values are shown"
        className="screen-only"
        value={view}
        onValueChange={setView}
        choices={valueViews.map((value) => ({ value, label: valueViewWords[value] }))}
      />
    </>
  );
}

/** Longer than between two keys of somebody who types a number, shorter than anybody waits for. */
const restMs = 150;

/** A value as it was when it last stood still for a moment. */
function useRested<T>(value: T): T {
  const [rested, setRested] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setRested(value), restMs);
    return () => clearTimeout(timer);
  }, [value]);
  return rested;
}
