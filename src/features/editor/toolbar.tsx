import type { Editor } from '@tiptap/core';
import { useEditorState } from '@tiptap/react';
import type { ReactNode } from 'react';
import { Button } from '#src/ui/button.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { type BlockChoice, blockChoices, choiceAt, chooseBlock } from './block-kinds.ts';
import { keepCaret } from '#src/lib/keep-caret.ts';
import { TableTools } from './table-tools.tsx';

type Props = {
  editor: Editor;
  onMakeLive: () => void;
  onNumbers: () => void;
  onReadAgain: () => void;
  onComment: () => void;
};

/** What can be done with the text, in words. Tools for tables appear when the caret is in one. */
export function Toolbar({ editor, onMakeLive, onNumbers, onReadAgain, onComment }: Props) {
  const state = useEditorState({
    editor,
    selector: ({ editor: now }) => ({
      choice: choiceAt(now),
      isStep: now.isActive('step'),
      marker: now.isActive('step') ? String(now.getAttributes('step')['marker'] ?? '') : '',
      depth: Number(now.getAttributes('step')['depth'] ?? 0),
      isTable: now.isActive('table'),
      tableKind: String(now.getAttributes('table')['kind'] ?? ''),
      canUndo: now.can().undo(),
      canRedo: now.can().redo(),
      bold: now.isActive('bold'),
      italic: now.isActive('italic'),
    }),
  });
  return (
    <div role="toolbar" aria-label="Page tools" className="leaf-tools screen-only">
      <select
        aria-label="Kind of block"
        className={`${inputLook} w-auto!`}
        value={state.choice}
        disabled={state.isTable}
        onChange={({ currentTarget }) => chooseBlock(editor, currentTarget.value as BlockChoice)}
      >
        {state.choice === '' ? <option value="">{state.isTable ? 'Table' : 'Figure'}</option> : null}
        {blockChoices.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </select>
      {state.isStep ? <StepTools editor={editor} marker={state.marker} depth={state.depth} /> : null}
      <Tool isOn={state.bold} onPress={() => editor.chain().focus().toggleMark('bold').run()}>
        Bold
      </Tool>
      <Tool isOn={state.italic} onPress={() => editor.chain().focus().toggleMark('italic').run()}>
        Italic
      </Tool>
      <Button onMouseDown={keepCaret} disabled={!state.canUndo} onClick={() => editor.chain().focus().undo().run()}>
        Undo
      </Button>
      <Button onMouseDown={keepCaret} disabled={!state.canRedo} onClick={() => editor.chain().focus().redo().run()}>
        Redo
      </Button>
      <Button onMouseDown={keepCaret} onClick={onMakeLive}>
        Make live
      </Button>
      <Button onMouseDown={keepCaret} onClick={onNumbers}>
        All numbers
      </Button>
      <Button onMouseDown={keepCaret} onClick={onReadAgain}>
        Read again
      </Button>
      <Button onMouseDown={keepCaret} onClick={onComment}>
        Comment
      </Button>
      {state.isTable ? <TableTools editor={editor} kind={state.tableKind} /> : null}
    </div>
  );
}

const Tool = ({ isOn, onPress, children }: { isOn: boolean; onPress: () => void; children: ReactNode }) => (
  <Button
    aria-pressed={isOn}
    className={isOn ? 'border-ink! bg-ink! text-leaf!' : ''}
    onMouseDown={keepCaret}
    onClick={onPress}
  >
    {children}
  </Button>
);

const deepest = 4;

function StepTools({ editor, marker, depth }: { editor: Editor; marker: string; depth: number }) {
  const change = (attributes: object): boolean => editor.chain().updateAttributes('step', attributes).run();
  return (
    <>
      <input
        aria-label="Marker of the step"
        className={`${inputLook} figures w-16!`}
        value={marker}
        maxLength={12}
        onChange={({ currentTarget }) => change({ marker: currentTarget.value })}
      />
      <Button onMouseDown={keepCaret} disabled={depth === 0} onClick={() => change({ depth: depth - 1 })}>
        Out
      </Button>
      <Button onMouseDown={keepCaret} disabled={depth === deepest} onClick={() => change({ depth: depth + 1 })}>
        In
      </Button>
    </>
  );
}
