import type { Editor } from '@tiptap/core';
import { useEffect, useRef, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import type { Quantity } from '#shared/api/quantities.ts';
import { formatQuantity } from '#shared/units/format-quantity.ts';
import { useLiveStore } from '#src/blocks/live-value/live-values.tsx';
import { Button } from '#src/ui/button.tsx';
import { Field } from '#src/ui/field.tsx';
import { NewQuantityForm } from './new-quantity-form.tsx';
import { type PrintedNumber, putLiveValue } from './printed-number.ts';
import { comesOutAs } from './propose-quantity.ts';

type Props = { editor: Editor; page: Page; found: PrintedNumber | string; onClose: () => void };

/** Turns a printed number into a live value: of a quantity that the manual has, or of a new one. */
export function MakeLivePanel({ editor, page, found, onClose }: Props) {
  const store = useLiveStore();
  const [isNew, setNew] = useState(false);
  const head = useRef<HTMLHeadingElement>(null);
  useEffect(() => head.current?.focus(), [found]);
  const put = (quantity: Quantity): void => {
    if (typeof found === 'string') return;
    putLiveValue(editor, found, quantity.id);
    onClose();
  };
  return (
    <section aria-label="Make live" className="margin-part">
      <h2 ref={head} tabIndex={-1} className="margin-head outline-none">
        Make live
      </h2>
      {typeof found === 'string' ? (
        <p className="text-doubt" role="alert">
          {found}
        </p>
      ) : (
        <>
          <Recognised found={found} />
          {store === null ? (
            <p className="text-pencil">Fetching the quantities of the manual …</p>
          ) : isNew ? (
            <NewQuantityForm store={store} manualId={page.manualId} pageId={page.id} found={found} onMade={put} />
          ) : (
            <Existing
              matching={store.quantities.filter((each) => comesOutAs(store, each, found))}
              all={store.quantities}
              onChoose={put}
            />
          )}
          {store === null ? null : (
            <Button className="mt-2" onClick={() => setNew(!isNew)}>
              {isNew ? 'Use a quantity of the manual' : 'New quantity'}
            </Button>
          )}
        </>
      )}
      <Button className="mt-2" look="quiet" onClick={onClose}>
        Put away
      </Button>
    </section>
  );
}

function Recognised({ found: { text, parsed } }: { found: PrintedNumber }) {
  return (
    <p className="mb-2">
      <span className="figures">{text}</span>
      <span className="text-pencil"> is read as </span>
      <span className="figures">
        {formatQuantity(parsed.magnitude, parsed.unit, { significant: 15 })
          .replace(/(\.\d*?)0+(?=\s|$)/, '$1')
          .replace(/\.(?=\s|$)/, '')}
      </span>
      {parsed.tolerance === undefined ? null : <span className="text-pencil"> with a tolerance</span>}
    </p>
  );
}

type ExistingProps = {
  matching: readonly Quantity[];
  all: readonly Quantity[];
  onChoose: (quantity: Quantity) => void;
};

function Existing({ matching, all, onChoose }: ExistingProps) {
  const [words, setWords] = useState('');
  const others = all.filter((each) => !matching.includes(each) && holds(each, words));
  return (
    <>
      {matching.length === 0 ? (
        <p className="text-pencil">No quantity of this manual comes out as this number.</p>
      ) : (
        <>
          <p className="cell-label">Comes out as printed</p>
          <Choices quantities={matching} onChoose={onChoose} />
        </>
      )}
      {all.length === matching.length ? null : (
        <details className="mt-2">
          <summary className="word-link">Another quantity of this manual</summary>
          <Field
            label="With these words"
            value={words}
            onChange={({ currentTarget }) => setWords(currentTarget.value)}
          />
          <Choices quantities={others} onChoose={onChoose} />
        </details>
      )}
    </>
  );
}

const holds = ({ symbol, label }: Quantity, words: string): boolean =>
  `${symbol} ${label}`.toLowerCase().includes(words.trim().toLowerCase());

const Choices = ({
  quantities,
  onChoose,
}: {
  quantities: readonly Quantity[];
  onChoose: (quantity: Quantity) => void;
}) => (
  <ul className="mt-1 grid gap-1">
    {quantities.map((each) => (
      <li key={each.id}>
        <Button className="w-full justify-start! text-left" onClick={() => onChoose(each)}>
          <span>
            {each.label === '' ? each.symbol : each.label}{' '}
            <span className="figures text-pencil">{each.expression ?? each.symbol}</span>
          </span>
        </Button>
      </li>
    ))}
  </ul>
);
