import { useQuery } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { searchKinds } from '#shared/api/search.ts';
import { manualsOnShelf } from '#src/api/manuals.ts';
import type { Wanted } from '#src/api/search.ts';
import { useShortcut } from '#src/lib/use-shortcut.ts';
import { Button } from '#src/ui/button.tsx';
import { FieldFrame, inputLook, Select } from '#src/ui/field.tsx';
import { ToggleGroup } from '#src/ui/toggle-group.tsx';

type Kind = NonNullable<Wanted['kind']> | 'all';
type Props = { wanted: Wanted; onWanted: (wanted: Wanted) => void };

const kindChoices: readonly { value: Kind; label: string }[] = [
  { value: 'all', label: 'Everything' },
  { value: 'text', label: 'Text' },
  { value: 'part', label: 'Parts' },
  { value: 'quantity', label: 'Values' },
];

/** The same question with one part of it changed; a part that is empty is left out. */
export function changed(wanted: Wanted, change: { q?: string; manualId?: string; kind?: string }): Wanted {
  const { q, manualId, kind } = { ...wanted, ...change };
  const known = searchKinds.find((each) => each === kind);
  return {
    q: q.trim(),
    ...(manualId === undefined || manualId === '' ? {} : { manualId }),
    ...(known === undefined ? {} : { kind: known }),
  };
}

export function SearchForm({ wanted, onWanted }: Props) {
  const [text, setText] = useState(wanted.q);
  const input = useRef<HTMLInputElement>(null);
  useShortcut('/', () => input.current?.select());
  const { data: manuals = [] } = useQuery(manualsOnShelf);
  return (
    <form
      className="screen-only mt-4 mb-6"
      onSubmit={(event) => {
        event.preventDefault();
        onWanted(changed(wanted, { q: text }));
      }}
    >
      <div className="grid gap-x-4 sm:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
        <FieldFrame
          label="Look for"
          hint="Words must all be on the page. “In quotes” they stand together. A number with its unit is found however it is written."
        >
          {(wiring) => (
            <div className="flex gap-2">
              <input
                {...wiring}
                ref={input}
                type="search"
                aria-keyshortcuts="/"
                maxLength={200}
                enterKeyHint="search"
                value={text}
                onChange={({ currentTarget }) => setText(currentTarget.value)}
                className={inputLook}
              />
              <Button look="main" type="submit">
                Search
              </Button>
            </div>
          )}
        </FieldFrame>
        <Select
          label="In"
          value={wanted.manualId ?? ''}
          onChange={({ currentTarget }) => onWanted(changed(wanted, { q: text, manualId: currentTarget.value }))}
        >
          <option value="">all manuals</option>
          {manuals.map(({ id, title }) => (
            <option key={id} value={id}>
              {title}
            </option>
          ))}
        </Select>
      </div>
      <ToggleGroup
        label="Which kind"
        choices={kindChoices}
        value={wanted.kind ?? 'all'}
        onValueChange={(kind) => onWanted(changed(wanted, { q: text, kind }))}
      />
    </form>
  );
}
