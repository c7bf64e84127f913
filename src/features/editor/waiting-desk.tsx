import type { ReactNode } from 'react';
import { PageTitle } from '#src/scan/page-title.tsx';
import { ScanViewer } from '#src/scan/scan-viewer.tsx';
import { TwoLeaves } from '#src/scan/two-leaves.tsx';
import type { EditedPage } from './edited-page.tsx';

export type Frame = Pick<Parameters<typeof EditedPage>[0], 'page' | 'scan' | 'links' | 'addressOf'>;

/** The desk with the scan on it, before there is text to work on. */
export const WaitingDesk = ({ page, scan, links, addressOf, children }: Frame & { children: ReactNode }) => (
  <div className="desk">
    <PageTitle page={page} doubts={page.doubtCount} addressOf={addressOf}>
      {links(false)}
    </PageTitle>
    <TwoLeaves
      scan={<ScanViewer {...scan} boxes={[]} active={null} />}
      spine={<div className="spine" />}
      page={
        <div className="leaf-scroll">
          <div className="page-sheet">{children}</div>
        </div>
      }
    />
  </div>
);
