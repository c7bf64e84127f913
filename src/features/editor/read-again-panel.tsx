import { useMutation } from '@tanstack/react-query';
import type { Editor } from '@tiptap/core';
import { useEffect, useRef, useState } from 'react';
import type { ZoneKind, ZoneReading } from '#shared/api/zone-readings.ts';
import type { Page } from '#shared/api/pages.ts';
import { imageOf } from '#src/api/pages.ts';
import { readZone } from '#src/api/zone-readings.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Select } from '#src/ui/field.tsx';
import { type ZonePlace, takeZoneReading, usualKind } from './zone-place.ts';

type Props = { editor: Editor; page: Page; places: readonly ZonePlace[]; onClose: () => void };

const placeWords: Record<ZonePlace['what'], string> = {
  block: 'this block',
  cell: 'this cell',
  table: 'the whole table',
  figure: 'the lettering of this figure',
};
const kindWords: Record<ZoneKind, string> = {
  text: 'lines of text or of a table',
  line: 'a single line',
  lettering: 'scattered lettering',
};

/** Reads one place of the page again, shows both readings beside the print, and leaves the choice to the person. */
export function ReadAgainPanel({ editor, page, places, onClose }: Props) {
  const [at, setAt] = useState(0);
  const place = places[at];
  const [kind, setKind] = useState<ZoneKind>(place === undefined ? 'text' : usualKind[place.what]);
  const { mutate, data, error, isPending, reset } = useMutation(readZone(page.id));
  const head = useRef<HTMLHeadingElement>(null);
  useEffect(() => head.current?.focus(), []);
  const choose = (index: number): void => {
    const next = places[index];
    if (next === undefined) return;
    setAt(index);
    setKind(usualKind[next.what]);
    reset();
  };
  return (
    <section aria-label="Read again" className="margin-part">
      <h2 ref={head} tabIndex={-1} className="margin-head outline-none">
        Read again
      </h2>
      {place === undefined ? (
        <p className="text-doubt" role="alert">
          There is nothing from the scan at the caret. Put it in a word, a cell or a figure that was read.
        </p>
      ) : (
        <>
          {places.length === 1 ? (
            <p className="mb-2 text-pencil">
              Reads {placeWords[place.what]} once more; nothing changes until you say so.
            </p>
          ) : (
            <Select label="What" value={at} onChange={({ currentTarget }) => choose(Number(currentTarget.value))}>
              {places.map(({ what }, index) => (
                <option key={what} value={index}>
                  {placeWords[what]}
                </option>
              ))}
            </Select>
          )}
          <img
            src={imageOf(page.id, { zone: place.zone, v: page.imageVersion ?? '' })}
            alt={`The print of ${placeWords[place.what]}`}
            className="mb-2 max-h-48 max-w-full border border-rule bg-leaf object-contain"
          />
          <Select
            label="Look at it as"
            value={kind}
            onChange={({ currentTarget }) => setKind(currentTarget.value as ZoneKind)}
          >
            {(Object.keys(kindWords) as ZoneKind[]).map((each) => (
              <option key={each} value={each}>
                {kindWords[each]}
              </option>
            ))}
          </Select>
          <Button busy={isPending && 'Reading …'} onClick={() => mutate({ zone: place.zone, as: kind })}>
            Read it
          </Button>
          {error === null ? null : (
            <p role="alert" className="mt-2 text-alarm">
              {saidBy(error)}
            </p>
          )}
          {data === undefined ? null : (
            <Outcome
              place={place}
              reading={data}
              onTake={() => {
                takeZoneReading(editor, place, data);
                onClose();
              }}
            />
          )}
        </>
      )}
      <div className="mt-2">
        <Button look="quiet" onClick={onClose}>
          Put away
        </Button>
      </div>
    </section>
  );
}

const level = (text: string): string => text.replace(/\s+/g, ' ').trim();
const sure = (confidence: number | null): string =>
  confidence === null ? 'written by a person' : `${Math.round(confidence)} % sure`;

function Outcome({ place, reading, onTake }: { place: ZonePlace; reading: ZoneReading; onTake: () => void }) {
  const { words, confidence } = reading;
  if (words.length === 0) return <p className="mt-2">Nothing can be made out there. What stands on the page stays.</p>;
  const text = words.map((word) => word.text).join(' ');
  if (level(text) === level(place.text))
    return <p className="mt-2">It reads the same as what stands there ({sure(confidence)}).</p>;
  const isSurer = place.confidence !== null && confidence > place.confidence;
  return (
    <div role="status" className="mt-2 border-l-2 border-signal pl-2">
      <p className="cell-label">Stands there, {sure(place.confidence)}</p>
      <p className="figures max-h-40 overflow-auto">{place.text === '' ? 'nothing' : place.text}</p>
      <p className="cell-label mt-2">
        Reads now, {sure(confidence)}
        {isSurer ? ', the surer of the two' : ''}
      </p>
      <p className="figures max-h-40 overflow-auto">{text}</p>
      <Button className="mt-2" look={isSurer ? 'main' : 'plain'} onClick={onTake}>
        Put the new reading there
      </Button>
    </div>
  );
}
