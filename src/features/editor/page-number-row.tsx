import { inputLook } from '#src/ui/field.tsx';
import { type Decision, type LiveProposal, asNew } from './live-proposals.ts';

type Props = { proposal: LiveProposal; decision: Decision; onDecide: (change: Partial<Decision>) => void };

/** One printed number, the words ahead of it, and what it is to be. */
export function PageNumberRow({ proposal: { number, matching, draft }, decision, onDecide }: Props) {
  const { isChosen, as, draft: own } = decision;
  const { text } = number;
  return (
    <li className="border-t border-rule pt-2">
      <label className="flex items-baseline gap-2">
        <input
          aria-label={`Make ${text} live`}
          type="checkbox"
          checked={isChosen}
          onChange={({ currentTarget }) => onDecide({ isChosen: currentTarget.checked })}
        />
        <span>
          <span className="text-pencil">{`${number.before.split(' ').slice(-4).join(' ')} `}</span>
          <strong className="figures font-semibold">{text}</strong>
        </span>
      </label>
      <select
        aria-label={`${text} is`}
        className={`${inputLook} mt-1`}
        value={as === asNew ? `${asNew} ${own.kind}` : as}
        onChange={({ currentTarget: { value } }) => onDecide({ isChosen: true, ...choiceOf(value, own) })}
      >
        {matching.map(({ id, label, symbol }) => (
          <option key={id} value={id}>
            {label === '' ? symbol : label}
          </option>
        ))}
        {draft.expression === '' ? null : <option value={`${asNew} derived`}>{`new: ${draft.expression}`}</option>}
        <option value={`${asNew} constant`}>new: a constant</option>
        <option value={`${asNew} input`}>new: an input, set at the bench</option>
      </select>
      {as === asNew ? (
        <input
          aria-label={`Symbol for ${text}`}
          className={`${inputLook} figures mt-1`}
          value={own.symbol}
          maxLength={60}
          onChange={({ currentTarget }) => onDecide({ draft: { ...own, symbol: currentTarget.value } })}
        />
      ) : null}
    </li>
  );
}

function choiceOf(value: string, draft: Decision['draft']): Pick<Decision, 'as' | 'draft'> {
  const [first = '', kind] = value.split(' ');
  return first === asNew
    ? { as: asNew, draft: { ...draft, kind: kind as Decision['draft']['kind'] } }
    : { as: value, draft };
}
