import { type ReactNode, useMemo, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import type { DocNode, Zone } from '#shared/document/define-block.ts';
import { imageOf } from '#src/api/pages.ts';
import { PageTitle } from '#src/scan/page-title.tsx';
import { PageWaiting, useAttention } from '#src/scan/page-waiting.tsx';
import { ScanViewer } from '#src/scan/scan-viewer.tsx';
import { TwoLeaves } from '#src/scan/two-leaves.tsx';
import { usePageLink } from '#src/scan/use-page-link.ts';
import { EditedPage } from './edited-page.tsx';
import './editor.css';

type Props = {
  page: Page;
  /** Other screens' parts that belong to a page: the setting bar, links and the history. */
  settingBar: ReactNode;
  links: (isDirty: boolean) => ReactNode;
  addressOf: (pageId: string) => string;
};

/** The page workspace: the scan on one leaf, the page being corrected on the other. */
export function Workspace({ page, settingBar, links, addressOf }: Props) {
  useAttention(page);
  const version = page.imageVersion ?? '';
  const [context] = useState(() => ({ imageOf: (zone: Zone) => imageOf(page.id, { zone, v: version }) }));
  const link = usePageLink();
  const size = useMemo(
    () =>
      page.imageVersion !== null && page.width !== null && page.height !== null
        ? { width: page.width, height: page.height }
        : null,
    [page.imageVersion, page.width, page.height],
  );
  const scan = { pageId: page.id, version, size, label: `Scan of page ${page.label}` };
  if (page.document !== null) {
    return (
      <EditedPage
        {...{ page, document: page.document as DocNode, context, link, scan, settingBar, links, addressOf }}
      />
    );
  }
  return (
    <div className="desk">
      <PageTitle page={page} doubts={0} addressOf={addressOf}>
        {links(false)}
      </PageTitle>
      <TwoLeaves
        scan={<ScanViewer {...scan} boxes={[]} active={null} />}
        spine={<div className="spine" />}
        page={
          <div className="leaf-scroll">
            <div className="page-sheet">
              <PageWaiting page={page} />
            </div>
          </div>
        }
      />
    </div>
  );
}
