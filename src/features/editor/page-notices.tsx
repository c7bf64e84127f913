import { Notice } from '#src/ui/notice.tsx';
import type { Standing } from './use-shared-text.ts';

/** What a person must know about this page before typing on. */
export const PageNotices = ({ standing }: { standing: Standing }) => (
  <div className="screen-only grid gap-2 px-4 empty:hidden">
    {standing === 'away' ? (
      <Notice kind="doubt" isUrgent title="The server cannot be reached.">
        Go on: what you type is kept in this browser, and is merged with what others wrote when the server is back.
      </Notice>
    ) : null}
    {standing === 'refused' ? (
      <Notice kind="alarm" title="This page is no longer open to you.">
        Sign in again, or ask an administrator whether your role has changed. What you typed last is kept in this
        browser.
      </Notice>
    ) : null}
  </div>
);
