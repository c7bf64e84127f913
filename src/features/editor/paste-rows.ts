import { Extension } from '@tiptap/core';
import { Plugin } from '@tiptap/pm/state';
import { isInTable } from '@tiptap/pm/tables';

/** Cells of a spreadsheet that come as plain text go into the cells from the caret on, as those that come as HTML do. */
export const PasteRows = Extension.create({
  name: 'pasteRows',
  addProseMirrorPlugins() {
    let isPasting = false;
    return [
      new Plugin({
        props: {
          handlePaste(view, event) {
            // What is pasted below comes through here again.
            if (isPasting) return false;
            const text = event.clipboardData?.getData('text/plain') ?? '';
            const hasTable = /<table/i.test(event.clipboardData?.getData('text/html') ?? '');
            if (hasTable || !text.includes('\t') || !isInTable(view.state)) return false;
            isPasting = true;
            try {
              return view.pasteHTML(tableHtml(text), event);
            } finally {
              isPasting = false;
            }
          },
        },
      }),
    ];
  },
});

const escaped = (text: string): string =>
  text.replace(/[&<>"]/g, (sign) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[sign] ?? sign);

/** Tab-separated lines as a table of HTML. */
const tableHtml = (text: string): string => {
  const lines = text.replace(/\r?\n$/, '').split(/\r?\n/);
  const rows = lines.map(
    (line) =>
      `<tr>${line
        .split('\t')
        .map((cell) => `<td>${escaped(cell.trim())}</td>`)
        .join('')}</tr>`,
  );
  return `<table><tbody>${rows.join('')}</tbody></table>`;
};
