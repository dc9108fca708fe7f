import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { Root } from '#src/app/frames/root.tsx';
import { Loading } from '#src/components/loading.tsx';
import { ErrorScreen } from '#src/app/screens/error-screen.tsx';
import { NotFoundScreen } from '#src/app/screens/not-found-screen.tsx';

const problemScreens: RouteObject[] = [
  { index: true, lazy: () => import('#src/app/screens/last-station-screen.tsx') },
  { path: 'trials', lazy: () => import('#src/app/screens/trials-screen.tsx') },
  { path: 'trials/:series', lazy: () => import('#src/app/screens/trials-screen.tsx') },
  { path: 'model', lazy: () => import('#src/app/screens/model-screen.tsx') },
  { path: 'model/claims', lazy: () => import('#src/app/screens/claims-screen.tsx') },
  { path: 'model/:n', lazy: () => import('#src/app/screens/model-screen.tsx') },
  { path: 'report', lazy: () => import('#src/app/screens/report-screen.tsx') },
  { path: 'leaks', lazy: () => import('#src/app/screens/leaks-screen.tsx') },
  { path: 'editions', lazy: () => import('#src/app/screens/editions-screen.tsx') },
  { path: 'editions/:n', lazy: () => import('#src/app/screens/edition-screen.tsx') },
  { path: 'editions/:n/print', lazy: () => import('#src/app/screens/edition-print.ts') },
  { path: 'settings', lazy: () => import('#src/features/problem/routes/problem-settings-screen.tsx') },
];

const signedInScreens: RouteObject[] = [
  {
    lazy: () => import('#src/app/frames/account-frame.tsx'),
    children: [
      { path: 'account', lazy: () => import('#src/features/session/routes/account-screen.tsx') },
      { path: 'admin', lazy: () => import('#src/features/admin/routes/admin-screen.tsx') },
    ],
  },
  {
    path: 'team/:team',
    lazy: () => import('#src/app/frames/team-frame.tsx'),
    children: [
      {
        lazy: () => import('#src/app/frames/team-screens-frame.tsx'),
        children: [
          { index: true, lazy: () => import('#src/features/season/routes/season-screen.tsx') },
          { path: 'fights', lazy: () => import('#src/app/screens/fights-screen.tsx') },
          { path: 'people', lazy: () => import('#src/app/screens/people-screen.tsx') },
          { path: 'copies', lazy: () => import('#src/app/screens/copies-screen.tsx') },
          {
            path: 'new-problem',
            lazy: () => import('#src/features/problem/routes/new-problem-screen.tsx'),
          },
        ],
      },
      {
        path: 'problem/:problem/copies/:copy',
        lazy: () => import('#src/app/screens/copy-preview-screen.tsx'),
      },
      {
        path: 'problem/:problem',
        lazy: () => import('#src/app/frames/problem-frame.tsx'),
        // A screen that fails leaves the top line standing.
        children: [{ errorElement: <ErrorScreen />, children: problemScreens }],
      },
    ],
  },
];

/** Every address of the product; each screen is a file of its own, loaded when it is first opened. */
export const routes: RouteObject[] = [
  {
    element: <Root />,
    hydrateFallbackElement: <Loading what="the page" />,
    children: [
      {
        errorElement: <ErrorScreen />,
        children: [
          { index: true, lazy: () => import('#src/features/session/routes/sign-in-screen.tsx') },
          { path: 'forgotten', lazy: () => import('#src/features/entry/routes/forgotten-screen.tsx') },
          { path: 'reset/:token', lazy: () => import('#src/features/entry/routes/reset-screen.tsx') },
          { path: 'join/:token', lazy: () => import('#src/features/entry/routes/join-screen.tsx') },
          { path: 'setup/:token', lazy: () => import('#src/features/entry/routes/setup-screen.tsx') },
          { path: 'copy/:token', lazy: () => import('#src/app/screens/copy-screen.tsx') },
          { lazy: () => import('#src/app/frames/signed-in-frame.tsx'), children: signedInScreens },
          { path: '*', element: <NotFoundScreen /> },
        ],
      },
    ],
  },
];

export function createRouter() {
  return createBrowserRouter(routes);
}
