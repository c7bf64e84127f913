import type { ComparedBlock } from './compare-blocks.ts';
import type { ComparedRow } from './compare-tables.ts';
import type { Piece } from './compare-words.ts';
import { Button } from '#src/ui/button.tsx';
import './compare.css';

const kindWords: Record<string, string> = {
  heading: 'Heading',
  paragraph: 'Paragraph',
  step: 'Step',
  admonition: 'WARNING, CAUTION or NOTE',
  table: 'Table',
  figure: 'Figure',
  caption: 'Caption',
  running: 'Running head or foot',
};
export const wordForKind = (kind: string): string => kindWords[kind] ?? kind;

/** Both states in one, or only what stood before, or only what stands after. */
export type Side = 'both' | 'older' | 'newer';
type CellPlaces = { from: [number, number]; to: [number, number] };
/** Brings one cell of the older table back; not given where that is not offered. */
export type RestoreCell = (cell: CellPlaces) => void;

type Props = { block: ComparedBlock; side?: Side; onRestoreCell?: RestoreCell | undefined };

/** What changed: what is gone is struck, what is new is underlined. Unchanged rows are left out where there are many. */
export function ComparedText({ block: { lines, rows, change }, side = 'both', onRestoreCell }: Props) {
  if (rows !== undefined && change === 'changed')
    return <ComparedTable rows={rows} side={side} onRestoreCell={onRestoreCell} />;
  const shown = lines.length > 3 ? lines.filter((pieces) => pieces.some(({ kind }) => kind !== 'same')) : lines;
  return (
    <div className="compared">
      {change === 'form' ? (
        <p className="text-small text-pencil">The words are the same; kind, marks or places differ.</p>
      ) : null}
      {shown.map((pieces, at) => (
        <p key={at}>
          <Pieces pieces={pieces} side={side} />
        </p>
      ))}
    </div>
  );
}

const rowWords = { changed: 'changed', gone: 'deleted', new: 'new', same: 'unchanged' } as const;
const standsOn: Record<Side, (row: ComparedRow) => boolean> = {
  both: () => true,
  older: ({ older }) => older !== null,
  newer: ({ newer }) => newer !== null,
};

/** The rows of a table that differ, each cell compared by itself. */
function ComparedTable({
  rows,
  side,
  onRestoreCell,
}: { rows: ComparedRow[] } & Pick<Props, 'onRestoreCell'> & { side: Side }) {
  const shown = rows.filter((row) => row.change !== 'same' && standsOn[side](row));
  const left = rows.filter(({ change }) => change === 'same').length;
  return (
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- it scrolls, so the keys must reach it
    <div role="region" aria-label="Rows that differ" tabIndex={0} className="compared overflow-x-auto">
      <table className="compared-table">
        <tbody>
          {shown.map((row, at) => (
            <tr key={at}>
              <th scope="row" className="cell-label">
                {rowWords[row.change]}
              </th>
              {row.cells.map((pieces, column) => (
                <td key={column}>
                  <Pieces pieces={pieces} side={side} />
                  <CellBack {...{ row, column, pieces, onRestoreCell }} />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {left === 0 ? null : (
        <p className="text-small text-pencil">{`${left} ${left === 1 ? 'row' : 'rows'} unchanged, not shown`}</p>
      )}
    </div>
  );
}

type BackProps = { row: ComparedRow; column: number; pieces: Piece[]; onRestoreCell: RestoreCell | undefined };

function CellBack({ row: { older, newer }, column, pieces, onRestoreCell }: BackProps) {
  const isChanged = pieces.some(({ kind }) => kind !== 'same');
  if (onRestoreCell === undefined || older === null || newer === null || !isChanged) return null;
  const was = pieces.map(({ kind, text }) => (kind === 'new' ? '' : text)).join('');
  return (
    <Button
      look="quiet"
      className="block text-small"
      aria-label={`Restore this cell to “${was}”`}
      onClick={() => onRestoreCell({ from: [older, column], to: [newer, column] })}
    >
      Restore
    </Button>
  );
}

const leftOut: Record<Side, Piece['kind'] | null> = { both: null, older: 'new', newer: 'gone' };

const Pieces = ({ pieces, side }: { pieces: readonly Piece[]; side: Side }) =>
  pieces.map((piece, index) => (piece.kind === leftOut[side] ? null : <PieceOf key={index} piece={piece} />));

function PieceOf({ piece: { kind, text } }: { piece: Piece }) {
  if (kind === 'gone') return <del>{text}</del>;
  return kind === 'new' ? <ins>{text}</ins> : text;
}
