import { useQuery } from '@tanstack/react-query';
import { type ReactNode, useMemo } from 'react';
import type { Page } from '#shared/api/pages.ts';
import { resolver } from '#shared/document/cross-references.ts';
import type { DocNode, Zone } from '#shared/document/define-block.ts';
import { imageOf } from '#src/api/pages.ts';
import { targetsIn } from '#src/api/references.ts';
import type { ChangeBars } from '#src/blocks/compare/change-bars.ts';
import { zoneKey } from '#src/blocks/look.ts';
import { PageView } from '#src/blocks/page-view.tsx';
import { PageWaiting, useAttention } from '#src/scan/page-waiting.tsx';
import { boxesOf, type ScanBox } from '#src/scan/scan-boxes.ts';
import { ScanViewer } from '#src/scan/scan-viewer.tsx';
import { Spine, ticksOf } from '#src/scan/spine.tsx';
import { TwoLeaves } from '#src/scan/two-leaves.tsx';
import { usePageLink } from '#src/scan/use-page-link.ts';
import { type PageNote, type PageNotes, usePageNotes } from '#src/scan/use-page-notes.ts';
import { wordsAt } from '#src/scan/words-at.ts';

type Props = {
  page: Page;
  /** Hits of a search, outlined on the scan. */
  hits: readonly Zone[];
  query: string;
  /** Comments of the page. */
  notes: readonly PageNote[];
  /** How they are shown in the margin; null leaves the margin out. */
  comments: ((notes: PageNotes) => ReactNode) | null;
  mayMark: boolean;
  bars?: ChangeBars | null;
};

/** A page that is read: its text beside its scan, each showing where the other stands. */
export function ReadPage({ page, hits, query, notes: given, comments, mayMark, bars = null }: Props) {
  useAttention(page);
  const version = page.imageVersion ?? '';
  const document = page.document as DocNode | null;
  const link = usePageLink(hits[0] ?? null);
  const context = useMemo(
    () => ({ imageOf: (zone: Zone) => imageOf(page.id, { zone, v: version }) }),
    [page.id, version],
  );
  const { data: targets } = useQuery(targetsIn(page.manualId));
  const resolve = useMemo(() => (targets === undefined ? null : resolver(targets)), [targets]);
  const boxes = useMemo(() => (document === null ? [] : boxesOf(document)), [document]);
  const notes = usePageNotes({ notes: given, text: document, textNow: () => document, link });
  const { boxes: noteBoxes, labelAt } = notes;
  const shown = useMemo(
    () => [...noteBoxes, ...boxes, ...hits.map((box): ScanBox => ({ key: zoneKey(box), box, kind: 'hit' }))],
    [noteBoxes, boxes, hits],
  );
  const ticks = useMemo(
    () => ticksOf([...noteBoxes, ...boxes], (key, kind) => (kind === 'note' ? labelAt(key) : wordsAt(document, key))),
    [noteBoxes, boxes, labelAt, document],
  );
  const size =
    page.imageVersion !== null && page.width !== null && page.height !== null
      ? { width: page.width, height: page.height }
      : null;
  return (
    <TwoLeaves
      keepsMargin={notes.draft !== null || notes.opened !== null}
      margin={comments?.(notes)}
      scan={
        <ScanViewer
          pageId={page.id}
          version={version}
          size={size}
          label={`Scan of page ${page.label}`}
          boxes={shown}
          active={link.active}
          onHover={link.setActive}
          onPick={(key) => {
            link.showInText(key);
            notes.openAt(key);
          }}
          onMark={mayMark ? notes.beginAt : undefined}
          focusBox={link.focusBox}
        />
      }
      spine={
        <Spine
          ticks={ticks}
          height={page.height}
          active={link.active}
          onGo={(key) => {
            link.goTo(key);
            notes.openAt(key);
          }}
          onHover={link.setActive}
        />
      }
      page={
        <div
          ref={link.leaf}
          role="region"
          aria-label="Page text"
          // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- it scrolls, so the keys must reach it
          tabIndex={0}
          className="leaf-scroll"
          onPointerOver={link.onTextHover}
        >
          <div className="page-sheet">
            <h2 className="sr-only">Page text</h2>
            {document === null ? (
              <PageWaiting page={page} />
            ) : (
              <PageView document={document} context={context} query={query} resolve={resolve} bars={bars} />
            )}
          </div>
        </div>
      }
    />
  );
}
