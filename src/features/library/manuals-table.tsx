import type { ReactNode } from 'react';
import { Link } from 'react-router';
import type { Manual } from '#shared/api/manuals.ts';
import { counted } from '#shared/kit/counted.ts';
import { ReadingState } from './reading-state.tsx';

type Props = {
  manuals: readonly Manual[];
  caption: string;
  /** What can be done with a manual of this list, besides opening it. */
  deedOf?: (manual: Manual) => ReactNode;
};

const head = 'cell-label px-3 py-2 font-normal whitespace-nowrap first:pl-0 last:pr-0';
const cell = 'px-3 py-3 first:pl-0 last:pr-0 max-md:hidden';

/** The drawer of cards: one ruled row for each manual, as in a parts list. On a narrow screen the columns fold under the title. */
export function ManualsTable({ manuals, caption, deedOf }: Props) {
  return (
    <table className="w-full border-collapse border-y border-ink text-left">
      <caption className="sr-only">{caption}</caption>
      <thead className="border-b border-ink align-bottom max-md:sr-only">
        <tr>
          <th scope="col" className={head}>
            Document
          </th>
          <th scope="col" className={head}>
            Title
          </th>
          <th scope="col" className={`${head} text-right`}>
            Pages
          </th>
          <th scope="col" className={`${head} text-right`}>
            Doubts
          </th>
          <th scope="col" className={`${head} text-right`}>
            Live values
          </th>
          <th scope="col" className={head}>
            Reading
          </th>
          {deedOf === undefined ? null : (
            <th scope="col" className={head}>
              <span className="sr-only">What to do</span>
            </th>
          )}
        </tr>
      </thead>
      <tbody className="divide-y divide-rule align-top">
        {manuals.map((manual) => (
          <ManualRow key={manual.id} manual={manual} deed={deedOf?.(manual)} />
        ))}
      </tbody>
    </table>
  );
}

function ManualRow({ manual, deed }: { manual: Manual; deed?: ReactNode }) {
  const { id, title, documentNumber, editionDate, pageCounts, doubtCount, quantityCount, deletedAt } = manual;
  return (
    <tr className="group">
      <td className={`${cell} figures w-[1%] leading-6 whitespace-nowrap`}>
        {documentNumber ?? <span className="text-pencil">no number</span>}
        {editionDate === null ? null : <span className="block text-small text-pencil">{editionDate}</span>}
      </td>
      <td className="py-3 md:px-3">
        {deletedAt === null ? (
          <Link
            to={`/manuals/${id}`}
            className="font-serif text-lead font-semibold decoration-signal underline-offset-4 group-hover:underline"
          >
            {title}
          </Link>
        ) : (
          <span className="font-serif text-lead font-semibold">{title}</span>
        )}
        <p className="text-pencil">{kindOf(manual)}</p>
        <div className="mt-2 flex flex-wrap gap-x-4 gap-y-1 md:hidden">
          {documentNumber === null ? null : <span className="figures">{documentNumber}</span>}
          <span>{counted(pageCounts.all, 'page')}</span>
          <Doubts count={doubtCount} />
          <span>{counted(quantityCount, 'live value')}</span>
          <ReadingState manual={manual} />
        </div>
        {deed === undefined ? null : <div className="mt-2 md:hidden">{deed}</div>}
      </td>
      <td className={`${cell} figures text-right`}>{pageCounts.all}</td>
      <td className={`${cell} figures text-right`}>
        {doubtCount === 0 ? '0' : <span className="doubtful">{doubtCount}</span>}
      </td>
      <td className={`${cell} figures text-right`}>{quantityCount}</td>
      <td className={`${cell} w-[1%] min-w-48`}>
        <ReadingState manual={manual} />
      </td>
      {deed === undefined ? null : <td className={`${cell} w-[1%] whitespace-nowrap`}>{deed}</td>}
    </tr>
  );
}

const kindOf = ({ equipment, maker }: Manual): string =>
  [equipment, maker].filter((each) => each !== null && each !== '').join(', ');

const Doubts = ({ count }: { count: number }) =>
  count === 0 ? <span>no doubts</span> : <span className="doubtful">{counted(count, 'doubt')}</span>;
