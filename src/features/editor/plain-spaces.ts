import { Extension } from '@tiptap/core';
import { Plugin } from '@tiptap/pm/state';

/** Marks that belong to one word; a space typed behind it does not take them along to what is typed next. */
const ofOneWord = ['word', 'doubt'];

/** A space ends a word: what is typed after it has no place on the scan. */
export const PlainSpaces = Extension.create({
  name: 'plainSpaces',
  addProseMirrorPlugins: () => [
    new Plugin({
      props: {
        handleTextInput(view, ...[from, to, text]) {
          if (text !== ' ' || from !== to) return false;
          const { state } = view;
          const marks = (state.storedMarks ?? state.doc.resolve(from).marks()).filter(
            ({ type }) => !ofOneWord.includes(type.name),
          );
          view.dispatch(state.tr.insert(from, state.schema.text(' ', marks)).scrollIntoView());
          return true;
        },
      },
    }),
  ],
});
