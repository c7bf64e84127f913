import type { Editor } from '@tiptap/core';
import { useMemo, useState } from 'react';
import type { DocNode } from '#shared/document/define-block.ts';
import { canonical } from '#src/blocks/compare/canonical.ts';
import { compareBlock } from '#src/blocks/compare/compare-blocks.ts';
import { ComparedText, wordForKind } from '#src/blocks/compare/compared-text.tsx';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { ToggleGroup } from '#src/ui/toggle-group.tsx';
import { type MergeItem, mergedDocument, mergeDocuments, type Side } from './merge.ts';
import type { Saving, Theirs } from './use-saving.ts';

type Props = { editor: Editor; saving: Saving; note: string };

/** Two people saved one page. Both texts are here; nothing is thrown away until a person says so. */
export const MergeDialog = ({ editor, saving, note }: Props) =>
  saving.theirs === null ? null : <Merging editor={editor} saving={saving} theirs={saving.theirs} note={note} />;

function Merging({ editor, saving, theirs, note }: Props & { theirs: Theirs }) {
  const { base, isSaving } = saving;
  const onClose = (): void => saving.setTheirs(null);
  const mine = useMemo(() => canonical(editor.getJSON()), [editor]);
  const items = useMemo(() => mergeDocuments(base.document, mine, theirs.document), [base, mine, theirs]);
  const [choices, setChoices] = useState<Record<string, Side>>({});
  const merged = mergedDocument(items, choices, theirs.document);
  const open = items.filter(({ decided, key }) => decided === null && choices[key] === undefined).length;
  const changed = items.filter(({ changedBy }) => changedBy !== 'nobody');
  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      width="wide"
      title={`Somebody saved revision ${theirs.revision} meanwhile`}
      intro={`${theirs.author} saved while you worked on revision ${base.revision}. Your text is kept. What only one of you changed is taken from that one; choose where you both changed the same block.`}
    >
      <ol className="grid gap-4">
        {changed.map((item) => (
          <MergeBlock
            key={item.key}
            item={item}
            author={theirs.author}
            choice={choices[item.key] ?? item.decided}
            onChoose={(side) => setChoices((before) => ({ ...before, [item.key]: side }))}
          />
        ))}
      </ol>
      <Actions>
        <Button
          look="main"
          disabled={merged === null}
          busy={isSaving && 'Saving …'}
          onClick={() => (merged === null ? undefined : void saving.saveMerged(merged, note))}
        >
          {`Save on top of revision ${theirs.revision}`}
        </Button>
        <Button onClick={onClose}>Go on with my text</Button>
        <span role="status" className="text-pencil">
          {open === 0 ? 'Everything is decided.' : `${counted(open, 'block')} to decide`}
        </span>
      </Actions>
    </Dialog>
  );
}

type BlockProps = { item: MergeItem; author: string; choice: Side | null; onChoose: (side: Side) => void };

function MergeBlock({ item: { key, base, mine, theirs, decided, changedBy }, author, choice, onChoose }: BlockProps) {
  const kind = wordForKind((mine ?? theirs ?? base)?.type ?? '');
  return (
    <li className="border-t border-rule pt-2">
      <div className="mb-1 flex flex-wrap items-center gap-3">
        <strong className="font-semibold">{kind}</strong>
        {decided === null ? (
          <ToggleGroup<Side | 'undecided'>
            label={`${kind}: whose text to keep`}
            choices={[
              { value: 'mine', label: 'Mine' },
              { value: 'theirs', label: 'Theirs' },
            ]}
            value={choice ?? 'undecided'}
            onValueChange={(side) => (side === 'undecided' ? undefined : onChoose(side))}
          />
        ) : (
          <span className="text-pencil">{decidedWords(changedBy, author)}</span>
        )}
      </div>
      {changedBy === 'theirs' ? null : <Version label="Mine" older={base} newer={mine} itemKey={key} />}
      {changedBy === 'theirs' || decided === null ? (
        <Version label={author} older={base} newer={theirs} itemKey={key} />
      ) : null}
    </li>
  );
}

function decidedWords(changedBy: MergeItem['changedBy'], author: string): string {
  if (changedBy === 'mine') return 'changed by you, kept';
  return changedBy === 'theirs' ? `changed by ${author}, taken` : 'changed the same way by both';
}

function Version({
  label,
  older,
  newer,
  itemKey,
}: {
  label: string;
  older: DocNode | undefined;
  newer: DocNode | undefined;
  itemKey: string;
}) {
  return (
    <div className="mt-1 grid grid-cols-[80px_minmax(0,1fr)] gap-2">
      <p className="cell-label pt-1">{label}</p>
      <ComparedText block={compareBlock(itemKey, older, newer)} />
    </div>
  );
}
