import type { Editor } from '@tiptap/core';

/** The kinds of block a person can choose, in the words of the trade. */
export const blockChoices = [
  { value: 'heading-1', label: 'Heading 1' },
  { value: 'heading-2', label: 'Heading 2' },
  { value: 'heading-3', label: 'Heading 3' },
  { value: 'paragraph', label: 'Paragraph' },
  { value: 'step', label: 'Step' },
  { value: 'warning', label: 'WARNING' },
  { value: 'caution', label: 'CAUTION' },
  { value: 'note', label: 'NOTE' },
  { value: 'caption', label: 'Caption' },
  { value: 'head', label: 'Running head' },
  { value: 'foot', label: 'Running foot' },
] as const;
export type BlockChoice = (typeof blockChoices)[number]['value'];

/** What the block with the caret is. '' in a table and on a figure, which are no such choice. */
export function choiceAt(editor: Editor): BlockChoice | '' {
  const { $from } = editor.state.selection;
  const { name } = $from.parent.type;
  const attributes = $from.parent.attrs;
  for (let depth = $from.depth; depth > 0; depth -= 1) {
    const around = $from.node(depth);
    if (around.type.name === 'table') return '';
    if (around.type.name === 'admonition') return around.attrs['kind'] as BlockChoice;
  }
  if (name === 'heading') return `heading-${Math.min(3, Number(attributes['level']))}` as BlockChoice;
  if (name === 'running') return attributes['place'] as BlockChoice;
  return name === 'paragraph' || name === 'step' || name === 'caption' ? name : '';
}

const admonitions: readonly string[] = ['warning', 'caution', 'note'];

/** Makes the block with the caret another kind; its text, its zone and its name stay. */
export function chooseBlock(editor: Editor, choice: BlockChoice): boolean {
  const isIn = editor.isActive('admonition');
  const chain = editor.chain().focus();
  if (admonitions.includes(choice)) {
    if (isIn) return chain.updateAttributes('admonition', { kind: choice }).run();
    const plain = editor.isActive('step') ? chain : chain.setNode('paragraph');
    return plain.wrapIn('admonition', { kind: choice }).run();
  }
  const out = isIn ? chain.lift('admonition') : chain;
  if (choice.startsWith('heading-')) return out.setNode('heading', { level: Number(choice.slice(-1)) }).run();
  if (choice === 'head' || choice === 'foot') return out.setNode('running', { place: choice }).run();
  return out.setNode(choice).run();
}
