import type { DecorationAttrs } from '@tiptap/pm/view';

type Other = { id?: string; name?: string };

/** So many inks tell the carets of different people apart; the name beside each says whose it is. */
const inkCount = 5;

/** The same person has the same ink in every window. */
function inkOf({ id, name }: Other): string {
  const letters = [...(id ?? name ?? '')];
  return String(letters.reduce((sum, letter) => (sum * 31 + (letter.codePointAt(0) ?? 0)) % 9973, 7) % inkCount);
}

/** Where somebody else has the caret: a thin line, with the name above it. */
export function drawCaret(other: Record<string, unknown>): HTMLElement {
  const caret = document.createElement('span');
  caret.className = 'other-caret';
  caret.dataset['ink'] = inkOf(other);
  const name = document.createElement('span');
  name.className = 'other-name';
  name.textContent = typeof other['name'] === 'string' ? other['name'] : 'Somebody';
  caret.append(name);
  return caret;
}

export const markSelection = (other: Record<string, unknown>): DecorationAttrs => ({
  class: 'other-selection',
  'data-ink': inkOf(other),
});
