import { useRef, useState } from 'react';
import { useNavigate } from 'react-router';
import { useShortcut } from '#src/lib/use-shortcut.ts';
import { inputLook } from '#src/ui/field.tsx';
import { cx } from '#src/lib/class-names.ts';

/** The field in the top bar: from anywhere, one key away. */
export function SearchField() {
  const [text, setText] = useState('');
  const input = useRef<HTMLInputElement>(null);
  const navigate = useNavigate();
  useShortcut('/', () => {
    input.current?.focus();
    input.current?.select();
  });
  return (
    <form
      role="search"
      aria-label="All manuals"
      onSubmit={(event) => {
        event.preventDefault();
        void navigate(text.trim() === '' ? '/search' : `/search?q=${encodeURIComponent(text.trim())}`);
      }}
    >
      <div className="relative">
        <input
          ref={input}
          type="search"
          value={text}
          onChange={({ currentTarget }) => setText(currentTarget.value)}
          aria-label="Search all manuals"
          aria-keyshortcuts="/"
          placeholder="Search: a word, a part, 455 kc"
          maxLength={200}
          enterKeyHint="search"
          className={cx(inputLook, 'pr-10')}
        />
        <kbd
          aria-hidden="true"
          className="figures pointer-events-none absolute top-1/2 right-2 -translate-y-1/2 rounded-sm border border-rule px-1.5 text-small leading-5 text-pencil max-md:hidden"
        >
          /
        </kbd>
      </div>
    </form>
  );
}
