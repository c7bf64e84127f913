import { canonical } from './canonical.ts';
import { compareDocuments } from './compare-blocks.ts';

/** Where a page differs from an earlier state of it, for bars in its margin. */
export type ChangeBars = {
  /** Blocks by their names. */
  blocks: ReadonlyMap<string, 'changed' | 'new'>;
  /** Behind these blocks something was taken out; '' is the top of the page. */
  goneBehind: ReadonlySet<string>;
  /** The earlier state, as it is told to those who listen. */
  since: string;
};

const noPage = { type: 'doc', content: [] };

/** Other marks and places alone are no change: the words are the same. Without an earlier page all of it is new. */
export function changeBars(earlier: unknown, now: unknown, since: string): ChangeBars {
  const blocks = new Map<string, 'changed' | 'new'>();
  const goneBehind = new Set<string>();
  let last = '';
  for (const { key, change } of compareDocuments(earlier === null ? noPage : canonical(earlier), canonical(now))) {
    if (change === 'gone') {
      goneBehind.add(last);
      continue;
    }
    last = key;
    if (change === 'changed' || change === 'new') blocks.set(key, change);
  }
  return { blocks, goneBehind, since };
}
