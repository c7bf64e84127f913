import { type ReactNode, useId, useState } from 'react';
import { cx } from '#src/lib/class-names.ts';

export type TitleCell = {
  label: string;
  value: ReactNode;
  /** Set in the face of numbers and names of documents. */
  isFigure?: boolean;
  /** Stays in sight when the block is folded on a narrow screen. */
  stays?: boolean;
  /** Takes half of a row. */
  isWide?: boolean;
};

type Props = {
  /** What kind of thing this is the title of. */
  kind: string;
  title: ReactNode;
  cells?: readonly TitleCell[];
  /** Stands under the title inside its cell: a line of more. */
  under?: ReactNode;
  className?: string;
};

/** The header of every screen: a ruled block of labelled cells, as in the corner of a drawing. Folds on a narrow screen. */
export function TitleBlock({ kind, title, cells = [], under, className }: Props) {
  const [isUnfolded, setUnfolded] = useState(false);
  const id = useId();
  const folds = cells.some(({ stays }) => stays !== true);
  return (
    <header className={cx('whole-on-paper flex flex-col border-2 border-ink bg-leaf lg:flex-row', className)}>
      <div className="min-w-0 flex-[5] px-3 pt-2 pb-3">
        <p className="cell-label">{kind}</p>
        <h1 className="mt-1 font-serif text-title font-semibold text-balance">{title}</h1>
        {under === undefined ? null : <div className="mt-1 text-pencil">{under}</div>}
      </div>
      {cells.length === 0 ? null : (
        <dl id={id} className="flex flex-[6] flex-wrap overflow-hidden border-t border-ink lg:border-t-0 lg:border-l">
          {cells.map((cell) => (
            <Cell key={cell.label} cell={cell} isFolded={!isUnfolded} />
          ))}
        </dl>
      )}
      {folds ? (
        <button
          type="button"
          aria-expanded={isUnfolded}
          aria-controls={id}
          onClick={() => setUnfolded(!isUnfolded)}
          className="screen-only min-h-8 border-t border-rule px-3 py-1 text-left text-signal underline underline-offset-3 sm:hidden"
        >
          {isUnfolded ? 'Fold the title block' : 'Whole title block'}
        </button>
      ) : null}
    </header>
  );
}

/** Each cell draws its left and top rule, shifted under the frame, so that rows of any length are ruled once. */
function Cell({ cell: { label, value, isFigure, stays, isWide }, isFolded }: { cell: TitleCell; isFolded: boolean }) {
  return (
    <div
      className={cx(
        '-mt-px -ml-px min-w-[104px] flex-1 border-t max-sm:basis-[40%] border-l border-rule px-3 pt-2 pb-2',
        isWide === true && 'sm:basis-[40%]',
        isFolded && stays !== true && 'hidden sm:block print:block',
      )}
    >
      <dt className="cell-label whitespace-nowrap">{label}</dt>
      <dd className={cx('mt-1 leading-5', isFigure === true && 'figures')}>{value}</dd>
    </div>
  );
}
