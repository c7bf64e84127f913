import { type ReactNode, useMemo, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { imageOf } from '#src/api/pages.ts';
import { PageWaiting, useAttention } from '#src/scan/page-waiting.tsx';
import { usePageLink } from '#src/scan/use-page-link.ts';
import { JoinedPage } from './joined-page.tsx';
import { WaitingDesk } from './waiting-desk.tsx';
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
  const frame = { page, scan, links, addressOf };
  if (page.document !== null) return <JoinedPage {...frame} {...{ context, link, settingBar }} />;
  return (
    <WaitingDesk {...frame}>
      <PageWaiting page={page} />
    </WaitingDesk>
  );
}
