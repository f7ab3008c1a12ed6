/** One line a page; every page but sign-in is loaded when it is first opened. */
import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, redirect } from 'react-router-dom';
import { myWorkQueries } from './queries/my-work-queries.ts';
import { sessionQueries } from './queries/session-queries.ts';

/** Loads who is signed in before any page of the team; others go to sign-in and come back. */
const requireSignIn =
  (client: QueryClient) =>
  async ({ request }: { request: Request }) => {
    const session = await client.ensureQueryData(sessionQueries.current());
    if (session.me !== null) return null;
    const { pathname, search } = new URL(request.url);
    return redirect(pathname === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(pathname + search)}`);
  };

/** Asked for while the page's own code is still on its way; whoever may not have it is told by the page. */
const askForMyWork = (client: QueryClient) => () => {
  void client.prefetchQuery(myWorkQueries.mine());
  return null;
};
const askForBoard = (client: QueryClient) => () => {
  void import('./queries/board-queries.ts').then(({ boardQueries }) => client.prefetchQuery(boardQueries.whole()));
  return null;
};

/** Nothing is drawn until a page's own code is there. */
const nothingYet = () => null;

/** The first screen depends on what the person may open. */
const goHome = async (client: QueryClient) => {
  const { me } = await client.ensureQueryData(sessionQueries.current());
  const { homeFor } = await import('./features/frame/places.ts');
  return redirect(me === null ? '/sign-in' : homeFor(me));
};

export const createRouter = (client: QueryClient) =>
  createBrowserRouter([
    { path: '/sign-in', lazy: () => import('./pages/sign-in-page.tsx'), HydrateFallback: nothingYet },
    {
      path: '/forgotten-password',
      lazy: () => import('./pages/forgotten-password-page.tsx'),
      HydrateFallback: nothingYet,
    },
    { path: '/new-password', lazy: () => import('./pages/new-password-page.tsx'), HydrateFallback: nothingYet },
    { path: '/invitation', lazy: () => import('./pages/invitation-page.tsx'), HydrateFallback: nothingYet },
    { path: '/inbox', lazy: () => import('./pages/local-inbox-page.tsx'), HydrateFallback: nothingYet },
    { path: '/problems/:name', lazy: () => import('./pages/problem-page.tsx'), HydrateFallback: nothingYet },
    {
      id: 'team',
      path: '/',
      loader: requireSignIn(client),
      shouldRevalidate: ({ currentUrl, nextUrl }) => currentUrl.pathname !== nextUrl.pathname,
      lazy: () => import('./pages/team-frame.tsx'),
      HydrateFallback: nothingYet,
      children: [
        { index: true, loader: () => goHome(client) },
        { path: 'my-work', loader: askForMyWork(client), lazy: () => import('./pages/my-work-page.tsx') },
        {
          path: 'board',
          loader: askForBoard(client),
          // What is looked at is in the address: changing it asks for nothing.
          shouldRevalidate: ({ currentUrl, nextUrl }) => currentUrl.pathname !== nextUrl.pathname,
          lazy: () => import('./pages/board-page.tsx'),
        },
        { path: 'children', lazy: () => import('./pages/children-page.tsx') },
        { path: 'children/new', lazy: () => import('./pages/new-child-page.tsx') },
        { path: 'children/import', lazy: () => import('./pages/import-page.tsx') },
        { path: 'children/:childId', lazy: () => import('./pages/child-page.tsx') },
        { path: 'children/:childId/record', lazy: () => import('./pages/child-record-page.tsx') },
        { path: 'children/:childId/edit', lazy: () => import('./pages/edit-child-page.tsx') },
        { path: 'protocol', lazy: () => import('./pages/protocol-page.tsx') },
        { path: 'protocol/:version', lazy: () => import('./pages/protocol-version-page.tsx') },
        { path: 'protocol/:version/proposal', lazy: () => import('./pages/protocol-proposal-page.tsx') },
        { path: 'team', lazy: () => import('./pages/team-page.tsx') },
        { path: 'team/settings', lazy: () => import('./pages/team-settings-page.tsx') },
        { path: 'team/:memberId', lazy: () => import('./pages/member-page.tsx') },
        { path: 'trail', lazy: () => import('./pages/trail-page.tsx') },
        { path: 'account', lazy: () => import('./pages/account-page.tsx') },
        { path: 'api-reference', lazy: () => import('./pages/api-reference-page.tsx') },
        { path: '*', lazy: () => import('./pages/nothing-here-page.tsx') },
      ],
    },
  ]);
