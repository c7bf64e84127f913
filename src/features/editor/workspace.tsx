import { useMemo, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { imageOf } from '#src/api/pages.ts';
import { PageWaiting, useAttention } from '#src/scan/page-waiting.tsx';
import { usePageLink } from '#src/scan/use-page-link.ts';
import type { EditedPage } from './edited-page.tsx';
import { JoinedPage } from './joined-page.tsx';
import { WaitingDesk } from './waiting-desk.tsx';
import './editor.css';

/** Other features' parts that belong to a page: the setting bar, links, the history and the comments. */
type Slots = Pick<Parameters<typeof EditedPage>[0], 'settingBar' | 'notes' | 'comments' | 'links' | 'addressOf'>;
type Props = Slots & { page: Page };

/** The page workspace: the scan on one leaf, the page being corrected on the other. */
export function Workspace({ page, settingBar, notes, comments, links, addressOf }: Props) {
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
  if (page.document !== null) return <JoinedPage {...frame} {...{ context, link, settingBar, notes, comments }} />;
  return (
    <WaitingDesk {...frame}>
      <PageWaiting page={page} />
    </WaitingDesk>
  );
}
