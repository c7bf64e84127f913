import type { ComponentType } from 'react';
import { createBrowserRouter } from 'react-router';
import { Frame } from './frame/frame.tsx';
import { Opening } from './opening.tsx';
import { ScreenFault, UnfetchedScreen } from './screen-fault.tsx';

type ScreenModule = { Component: ComponentType };

/**
 * A screen that is fetched when it is first opened. The router draws nothing at all when the fetching fails, so a
 * screen that says so is put in its place.
 */
const fetched = (load: () => Promise<ScreenModule>) => ({
  lazy: (): Promise<ScreenModule> => load().catch(() => ({ Component: UnfetchedScreen })),
  ErrorBoundary: ScreenFault,
});

/** One file per screen. The fault of one screen leaves the frame standing. */
export const router = createBrowserRouter([
  {
    ErrorBoundary: ScreenFault,
    HydrateFallback: Opening,
    children: [
      { path: '/sign-in', ...fetched(() => import('./routes/sign-in.tsx')) },
      { path: '/set-password', ...fetched(() => import('./routes/set-password.tsx')) },
      {
        Component: Frame,
        children: [
          { index: true, ...fetched(() => import('./routes/library.tsx')) },
          { path: '/manuals/:manualId', ...fetched(() => import('./routes/manual.tsx')) },
          { path: '/manuals/:manualId/calculations', ...fetched(() => import('./routes/calculations.tsx')) },
          { path: '/manuals/:manualId/editions', ...fetched(() => import('./routes/editions.tsx')) },
          { path: '/pages/:pageId', ...fetched(() => import('./routes/page-workspace.tsx')) },
          { path: '/pages/:pageId/read', ...fetched(() => import('./routes/reading-view.tsx')) },
          { path: '/search', ...fetched(() => import('./routes/search.tsx')) },
          { path: '/people', ...fetched(() => import('./routes/people.tsx')) },
          { path: '/outbox', ...fetched(() => import('./routes/outbox.tsx')) },
          { path: '/audit', ...fetched(() => import('./routes/audit.tsx')) },
          { path: '*', ...fetched(() => import('./routes/not-found.tsx')) },
        ],
      },
    ],
  },
]);
