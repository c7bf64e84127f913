import { type KeyboardEvent, useEffect, useId, useRef } from 'react';
import type { PersonName } from '#shared/api/people.ts';
import { counted } from '#shared/kit/counted.ts';
import { cx } from '#src/lib/class-names.ts';
import { inputLook } from '#src/ui/field.tsx';
import { useMentions } from './use-mentions.ts';

type Props = {
  label: string;
  words: string;
  onWords: (words: string) => void;
  onMention: (person: PersonName) => void;
  /** Ctrl Enter. */ onSend: () => void;
  /** Escape, while no names are listed. */ onCancel: () => void;
};

/** Where a comment is written. An @ lists the people; arrows and Enter choose, Escape puts the list away. */
export function WordsField({ label, words, onWords, onMention, onSend, onCancel }: Props) {
  const id = useId();
  const field = useRef<HTMLTextAreaElement>(null);
  const mentions = useMentions(words);
  const { offered, marked } = mentions;
  useEffect(() => {
    field.current?.focus();
    field.current?.setSelectionRange(field.current.value.length, field.current.value.length);
  }, []);
  const choose = (person: PersonName): void => {
    const next = mentions.take(person);
    if (next === null) return;
    onWords(next.words);
    onMention(person);
    requestAnimationFrame(() => {
      field.current?.focus();
      field.current?.setSelectionRange(next.caret, next.caret);
    });
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    const person = offered[marked];
    if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) onSend();
    else if (person !== undefined && (event.key === 'Enter' || (event.key === 'Tab' && !event.shiftKey)))
      choose(person);
    else if (!mentions.onKey(event.key)) {
      if (event.key !== 'Escape') return;
      onCancel();
    }
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div className="mb-2">
      <label htmlFor={id} className="mb-1 block leading-5 font-semibold">
        {label}
      </label>
      <textarea
        ref={field}
        id={id}
        rows={3}
        className={inputLook}
        value={words}
        aria-autocomplete="list"
        aria-controls={offered.length === 0 ? undefined : `${id}-people`}
        aria-activedescendant={offered.length === 0 ? undefined : `${id}-${offered[marked]?.id}`}
        aria-describedby={`${id}-hint`}
        onChange={({ currentTarget }) => {
          mentions.typed(currentTarget.value, currentTarget.selectionStart);
          onWords(currentTarget.value);
        }}
        onSelect={({ currentTarget }) => mentions.moved(currentTarget.selectionStart)}
        onKeyDown={onKeyDown}
      />
      {offered.length === 0 ? null : (
        <ul id={`${id}-people`} role="listbox" aria-label="People" className="mention-list">
          {offered.map((person, index) => (
            // eslint-disable-next-line jsx-a11y/click-events-have-key-events -- the keys are obeyed by the field, which keeps the focus
            <li
              key={person.id}
              id={`${id}-${person.id}`}
              role="option"
              aria-selected={index === marked}
              tabIndex={-1}
              className={cx('mention', index === marked && 'mention-marked')}
              onMouseDown={(event) => event.preventDefault()}
              onClick={() => choose(person)}
            >
              {person.name}
            </li>
          ))}
        </ul>
      )}
      <p role="status" className="sr-only">
        {offered.length === 0 ? '' : `${counted(offered.length, 'person', 'people')}: arrows move, Enter mentions.`}
      </p>
      <p id={`${id}-hint`} className="mt-1 text-small text-pencil">
        @ and a name sends that person an e-mail.
      </p>
    </div>
  );
}
