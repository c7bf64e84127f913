import type { ComparedBlock, Piece } from './compare-blocks.ts';
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

/** What changed, in line: what is gone is struck, what is new is underlined. Unchanged rows are left out where there are many. */
export function ComparedText({ block: { lines, change } }: { block: ComparedBlock }) {
  const shown = lines.length > 3 ? lines.filter((pieces) => pieces.some(({ kind }) => kind !== 'same')) : lines;
  return (
    <div className="compared">
      {change === 'form' ? (
        <p className="text-small text-pencil">The words are the same; kind, marks or places differ.</p>
      ) : null}
      {shown.map((pieces, at) => (
        <p key={at}>
          {pieces.map((piece, index) => (
            <PieceOf key={index} piece={piece} />
          ))}
        </p>
      ))}
    </div>
  );
}

function PieceOf({ piece: { kind, text } }: { piece: Piece }) {
  if (kind === 'gone') return <del>{text}</del>;
  return kind === 'new' ? <ins>{text}</ins> : text;
}
