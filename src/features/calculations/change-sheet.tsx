import { keepPreviousData, useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router';
import type { z } from 'zod';
import type { changeRow, changeSheet } from '#shared/api/calculations.ts';
import type { Setting } from '#shared/api/quantities.ts';
import type { InputValues } from '#shared/calc/evaluate.ts';
import { counted } from '#shared/kit/counted.ts';
import { changeSheetFile, changeSheetOf } from '#src/api/calculations.ts';
import { settingsOfManual } from '#src/api/quantities.ts';
import { useSetting } from '#src/blocks/live-value/live-values.tsx';
import { useSettingWords } from '#src/blocks/live-value/setting-words.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Select } from '#src/ui/field.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { toast } from '#src/ui/toast.ts';

type Row = z.infer<typeof changeRow>;
type Sheet = z.infer<typeof changeSheet>;

const home = 'home';
const present = 'present';

/** What differs between two settings, page by page: the list to go through when a set is moved to another channel. */
export function ChangeSheetView({ manualId }: { manualId: string }) {
  const setting = useSetting();
  const words = useSettingWords(manualId);
  const { data: saved = [] } = useQuery(settingsOfManual(manualId));
  const [from, setFrom] = useState(home);
  const [to, setTo] = useState(present);
  const between = { before: inputsOf(from, setting, saved), after: inputsOf(to, setting, saved) };
  const {
    data: sheet,
    error,
    refetch,
  } = useQuery({
    ...changeSheetOf(manualId, between),
    placeholderData: keepPreviousData,
  });
  const choices = [
    { value: home, label: 'Home, as printed' },
    { value: present, label: `The present setting: ${words}` },
    ...saved.map(({ id, name }) => ({ value: id, label: name })),
  ];
  return (
    <section aria-label="Change sheet">
      <div className="screen-only flex flex-wrap gap-x-4">
        <SettingChoice label="From" value={from} choices={choices} onChange={setFrom} />
        <SettingChoice label="To" value={to} choices={choices} onChange={setTo} />
      </div>
      {sheet !== undefined ? (
        <Sheet sheet={sheet} manualId={manualId} between={between} />
      ) : error === null ? (
        <Pending what="Comparing the settings …" />
      ) : (
        <Failure what="The settings could not be compared" error={error} onRetry={() => void refetch()} />
      )}
    </section>
  );
}

function inputsOf(which: string, setting: InputValues, saved: readonly Setting[]): InputValues {
  if (which === home) return {};
  return which === present ? setting : (saved.find(({ id }) => id === which)?.inputs ?? {});
}

type ChoiceProps = {
  label: string;
  value: string;
  choices: readonly { value: string; label: string }[];
  onChange: (value: string) => void;
};

const SettingChoice = ({ label, value, choices, onChange }: ChoiceProps) => (
  <Select
    label={label}
    frame="flex-1 basis-56 sm:max-w-96"
    value={value}
    onChange={({ currentTarget }) => onChange(currentTarget.value)}
  >
    {choices.map((choice) => (
      <option key={choice.value} value={choice.value}>
        {choice.label}
      </option>
    ))}
  </Select>
);

type SheetProps = { sheet: Sheet; manualId: string; between: { before: InputValues; after: InputValues } };

function Sheet({ sheet: { rows, same, leaving, unavailable }, manualId, between }: SheetProps) {
  const file = useMutation(changeSheetFile(manualId));
  if (rows.length === 0) {
    return (
      <Empty title="Nothing differs">
        Both settings give every value alike. Set another channel above, or choose a saved setting.
      </Empty>
    );
  }
  return (
    <>
      <div className="mb-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <p role="status" className="flex flex-1 basis-60 flex-wrap gap-x-4">
          <span>{`${counted(rows.length, 'value')} to change, ${same} stay as they are`}</span>
          {leaving === 0 ? null : (
            <StateWord tone="alarm" shape="cross">
              {`${leaving} outside limits`}
            </StateWord>
          )}
          {unavailable === 0 ? null : (
            <StateWord tone="alarm" shape="cross">
              {`${unavailable} unavailable`}
            </StateWord>
          )}
        </p>
        <Button className="screen-only" onClick={() => window.print()}>
          Print
        </Button>
        <Button
          className="screen-only"
          busy={file.isPending && 'Writing …'}
          onClick={() => file.mutate(between, { onSuccess: keepFile, onError: (error) => toast.error(saidBy(error)) })}
        >
          Download as CSV
        </Button>
      </div>
      <RuledTable caption="Change sheet" head={<Head />}>
        {rows.map((row, index) => (
          <ChangedRow key={`${row.pageId} ${row.symbol} ${row.printed}`} row={row} isFirst={startsPage(rows, index)} />
        ))}
      </RuledTable>
      <p className="mt-3 max-w-[70ch] text-small text-pencil">
        Worked-out values are an aid; they authorise nothing. Check each against the equipment, and mind high voltage
        and stored charge while you do.
      </p>
    </>
  );
}

const startsPage = (rows: readonly Row[], index: number): boolean => rows[index - 1]?.pageId !== rows[index]?.pageId;

function keepFile(blob: Blob): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(blob);
  link.download = 'change sheet.csv';
  link.click();
  URL.revokeObjectURL(link.href);
}

const Head = () => (
  <>
    <Th>Page</Th>
    <Th>Value</Th>
    <Th>As printed</Th>
    <Th>Before</Th>
    <Th>After</Th>
    <Th>Limits</Th>
  </>
);

function ChangedRow({ row, isFirst }: { row: Row; isFirst: boolean }) {
  const { pageId, pageLabel, label, symbol, printed, before, after, limits, problem } = row;
  return (
    <tr className={isFirst ? 'border-t-ink' : undefined}>
      <Td className="figures whitespace-nowrap">
        {!isFirst ? null : pageId === null ? (
          <span className="text-pencil">on no page</span>
        ) : (
          <Link to={`/pages/${pageId}/read`} className="word-link">
            {pageLabel}
          </Link>
        )}
      </Td>
      <Td className="min-w-44">{label === '' ? symbol : label}</Td>
      <Td className="figures whitespace-nowrap text-pencil">{printed ?? ''}</Td>
      <Td className="figures whitespace-nowrap">{before === '' ? 'unavailable' : before}</Td>
      <Td className={after === '' ? 'max-w-80 text-alarm' : 'figures font-semibold whitespace-nowrap text-signal'}>
        {after === '' ? (problem ?? 'unavailable') : after}
      </Td>
      <Td>
        <LimitWord limits={limits} />
      </Td>
    </tr>
  );
}

function LimitWord({ limits }: { limits: Row['limits'] }) {
  if (limits === null) return null;
  return limits === 'returns' ? (
    <StateWord tone="good" shape="tick">
      within again
    </StateWord>
  ) : (
    <StateWord tone="alarm" shape="cross">
      {limits === 'leaves' ? 'passes out' : 'still outside'}
    </StateWord>
  );
}
