import { type ReactNode, useState } from 'react';
import { useMedia } from '#src/lib/use-media.ts';
import { ToggleGroup } from '#src/ui/toggle-group.tsx';
import './leaves.css';

export type Side = 'page' | 'scan';

type Props = {
  scan: ReactNode;
  spine: ReactNode;
  page: ReactNode;
  /** Stands beside the page where there is room. */ margin?: ReactNode;
  /** On a phone the margin belongs to the page; here it is shown beneath the scan as well. */ keepsMargin?: boolean;
};

const sides = [
  { value: 'page', label: 'Page' },
  { value: 'scan', label: 'Scan' },
] as const;

/** Scan and page side by side with the spine between them. On a phone they are front and back of one sheet. */
export function TwoLeaves({ scan, spine, page, margin, keepsMargin = false }: Props) {
  const isNarrow = useMedia('(width < 768px)');
  const [side, setSide] = useState<Side>('page');
  const shows = (each: Side): boolean => !isNarrow || side === each;
  return (
    <>
      {isNarrow ? (
        <div className="leaves-turn screen-only">
          <ToggleGroup label="Side of the sheet" choices={sides} value={side} onValueChange={setSide} />
        </div>
      ) : null}
      <div className="leaves" data-margin={margin !== undefined || undefined}>
        <div className="leaf leaf-scan screen-only" hidden={!shows('scan')}>
          {scan}
        </div>
        <div className="leaves-spine screen-only">{spine}</div>
        <div className="leaf leaf-page" hidden={!shows('page')}>
          {page}
        </div>
        {margin === undefined ? null : (
          <aside aria-label="Margin" className="leaf-margin screen-only" hidden={!keepsMargin && !shows('page')}>
            {margin}
          </aside>
        )}
      </div>
    </>
  );
}
