/** The keys of the workspace, each once: what is listed in the help is what is obeyed. `code` is the place on the keyboard. */
export type DeedName = 'next' | 'previous' | 'settle' | 'save' | 'live' | 'readAgain' | 'comment' | 'help';
type Key = {
  name: DeedName;
  shown: string;
  says: string;
  code: string;
  alt?: true;
  ctrl?: true;
  /** Only while nothing is being typed. */ isPlain?: true;
};

export const deedKeys: readonly Key[] = [
  { name: 'next', shown: 'Alt N', says: 'next doubt', code: 'KeyN', alt: true },
  { name: 'previous', shown: 'Alt P', says: 'previous doubt', code: 'KeyP', alt: true },
  { name: 'settle', shown: 'Alt Enter', says: 'the doubtful word is right as it stands', code: 'Enter', alt: true },
  {
    name: 'live',
    shown: 'Ctrl Alt L',
    says: 'make the printed number at the caret live',
    code: 'KeyL',
    alt: true,
    ctrl: true,
  },
  { name: 'readAgain', shown: 'Alt R', says: 'read the block or cell at the caret again', code: 'KeyR', alt: true },
  {
    name: 'comment',
    shown: 'Alt C',
    says: 'comment on the chosen words, or on those at the caret',
    code: 'KeyC',
    alt: true,
  },
  { name: 'save', shown: 'Ctrl S', says: 'save a revision', code: 'KeyS', ctrl: true },
  { name: 'help', shown: '?', says: 'these keys, while nothing is being typed', code: '?', isPlain: true },
];

/** Keys that the editor and the scan obey by themselves; listed for the help only. */
export const otherKeys: readonly { shown: string; says: string }[] = [
  { shown: 'Ctrl B, Ctrl I, Ctrl U', says: 'bold, italic, underlined' },
  { shown: 'Ctrl Z, Ctrl Shift Z', says: 'undo, redo' },
  { shown: 'Enter at the end of a step', says: 'the next step, with the next marker' },
  { shown: 'Shift Enter', says: 'a new line in the same block' },
  { shown: 'Tab, Shift Tab in a table', says: 'the next cell, the one before; behind the last, a new row' },
  { shown: 'Enter on a live value', says: 'all about the value' },
  { shown: '+, -, 0 and the arrows on the scan', says: 'closer, further off, whole page, move' },
  { shown: 'Arrows on the spine', says: 'from mark to mark; Enter goes there on both leaves' },
];

type Pressed = Pick<KeyboardEvent, 'altKey' | 'ctrlKey' | 'metaKey' | 'shiftKey' | 'code' | 'key' | 'target'>;

export function deedOf(event: Pressed): DeedName | null {
  const ctrl = event.ctrlKey || event.metaKey;
  const found = deedKeys.find(({ code, alt = false, ctrl: wantsCtrl = false, isPlain = false }) => {
    if (isPlain) return event.key === code && !ctrl && !event.altKey && !isTyping(event.target);
    return event.code === code && event.altKey === alt && ctrl === wantsCtrl && !event.shiftKey;
  });
  return found?.name ?? null;
}

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement &&
  (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName));
