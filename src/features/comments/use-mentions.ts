import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { PersonName } from '#shared/api/people.ts';
import { everyName } from '#src/api/comments.ts';
import { me } from '#src/api/session.ts';
import { mentionAt, peopleFor, withMention } from './mention.ts';

type Mentions = {
  /** People who fit the @ at the caret; none while there is no @, or once the list was put away. */
  offered: readonly PersonName[];
  marked: number;
  typed: (words: string, caret: number) => void;
  moved: (caret: number) => void;
  /** The words with the person's name in them. */
  take: (person: PersonName) => { words: string; caret: number } | null;
  /** Moves in the list, or puts it away; false where the key means something else. */
  onKey: (key: string) => boolean;
};

/** The list of people that an @ opens. */
export function useMentions(words: string): Mentions {
  const { data: everybody = [] } = useQuery(everyName);
  const { data: person } = useQuery(me);
  const people = everybody.filter(({ id }) => id !== person?.id);
  const [caret, setCaret] = useState(words.length);
  const [at, setAt] = useState(0);
  /** The @ that needs no list any more. */
  const [putAway, setPutAway] = useState<number | null>(null);
  const mention = mentionAt(words, caret);
  const offered = mention === null || mention.from === putAway ? [] : peopleFor(mention.query, people);
  const count = offered.length;
  const marked = Math.min(at, count - 1);
  return {
    ...{ offered, marked, moved: setCaret },
    typed(next, position) {
      if (mentionAt(next, position)?.from !== putAway) setPutAway(null);
      setAt(0);
      setCaret(position);
    },
    take(person) {
      if (mention === null) return null;
      const next = withMention(words, mention, person);
      setCaret(next.caret);
      setPutAway(mention.from);
      return next;
    },
    onKey(key) {
      if (count === 0) return false;
      if (key === 'ArrowDown') setAt((marked + 1) % count);
      else if (key === 'ArrowUp') setAt((marked + count - 1) % count);
      else if (key === 'Escape') setPutAway(mention?.from ?? null);
      else return false;
      return true;
    },
  };
}
