import type { Quantity } from '#shared/api/quantities.ts';
import { proposeName } from '#shared/calc/propose-name.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import type { PrintedNumber } from './printed-number.ts';
import { comesOutAs } from './propose-quantity.ts';
import { relationsAmong } from './propose-relations.ts';
import { type QuantityDraft, printedUnit } from './quantity-from-print.ts';

/** What a printed number may be: quantities of the manual that come out as it, and a new one, the likeliest first. */
export type LiveProposal = {
  number: PrintedNumber;
  matching: readonly Quantity[];
  draft: QuantityDraft;
  /** One quantity comes out as printed, or a formula over the others does. */
  isLikely: boolean;
};

/** A proposal for each printed number; the new ones among them have names of their own. */
export function liveProposals(store: LiveStore, numbers: readonly PrintedNumber[]): LiveProposal[] {
  const taken = store.quantities.map(({ symbol }) => symbol);
  const relations = relationsAmong(store, numbers);
  return numbers.map((number, index) => {
    const matching = store.quantities.filter((each) => comesOutAs(store, each, number));
    const { symbol, label } = proposeName(number.before, taken);
    if (matching.length === 0) taken.push(symbol);
    const expression = relations[index] ?? '';
    const kind = expression === '' ? 'constant' : 'derived';
    return {
      number,
      matching,
      draft: { symbol, label, kind, unit: printedUnit(number), expression },
      isLikely: matching.length === 1 || (matching.length === 0 && expression !== ''),
    };
  });
}

/** What a person has decided of one number: whether to make it live, and as what. */
export type Decision = { isChosen: boolean; as: string; draft: QuantityDraft };
/** Stands for a new quantity among the ids of those that the manual has. */
export const asNew = 'new';

export const firstDecision = ({ matching, draft, isLikely }: LiveProposal): Decision => ({
  isChosen: isLikely,
  as: matching[0]?.id ?? asNew,
  draft,
});
