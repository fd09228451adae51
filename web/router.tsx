import { type QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, type LoaderFunction, type RouteObject } from 'react-router-dom';
import { type ComponentType } from 'react';
import { AppShell } from './app/shell/app-shell.tsx';
import { PageProblem } from './app/shell/page-problem.tsx';

/** What a page file exports: `loader(client)` fills the cache, `Component` reads it, `ErrorBoundary` says what went wrong. */
interface PageModule {
  Component: ComponentType;
  loader?: (client: QueryClient) => LoaderFunction;
  ErrorBoundary?: ComponentType;
}
type Page = () => Promise<PageModule>;

/** With the binding at the left: for people who have signed in. */
const IN_THE_HOUSE: Record<string, Page> = {
  '/': () => import('./app/shelf-page.tsx'),
  '/new': () => import('./app/new-pattern-page.tsx'),
  '/new/written': () => import('./app/written-pattern-page.tsx'),
  '/patterns/:patternId/recording': () => import('./app/recording-page.tsx'),
  '/patterns/:patternId/reading/:readingId': () => import('./app/reading-page.tsx'),
  '/patterns/:patternId/recording/held': () => import('./app/held-page.tsx'),
  '/patterns/:patternId/bench': () => import('./app/bench-page.tsx'),
  '/patterns/:patternId/sheet': () => import('./app/sheet-page.tsx'),
  '/patterns/:patternId/editions': () => import('./app/editions-page.tsx'),
  '/account': () => import('./app/account-page.tsx'),
  '/studio': () => import('./app/studio-page.tsx'),
  '/studio/open': () => import('./app/open-studio-page.tsx'),
};

/** Without it: covers and letters. */
const AT_THE_DOOR: Record<string, Page> = {
  '/sign-in': () => import('./app/sign-in-page.tsx'),
  '/sign-up': () => import('./app/sign-up-page.tsx'),
  '/confirm': () => import('./app/confirm-page.tsx'),
  '/forgotten': () => import('./app/forgotten-page.tsx'),
  '/reset': () => import('./app/reset-page.tsx'),
  '/invitation': () => import('./app/invitation-page.tsx'),
};

/** It fills the window: read from across a room. */
const FULL_PAGE: Record<string, Page> = {
  '/patterns/:patternId/card': () => import('./app/card-page.tsx'),
};

const routes = (pages: Record<string, Page>, client: QueryClient): RouteObject[] =>
  Object.entries(pages).map(([path, page]) => ({
    path,
    lazy: async () => {
      const { loader, ...rest } = await page();
      return loader ? { ...rest, loader: loader(client) } : rest;
    },
  }));

/** While the first page is on its way: said, and nothing drawn that would jump. */
const Opening = () => (
  <p role="status" className="sr-only">
    Opening the page
  </p>
);

/** The table of pages. Each is fetched when somebody goes there. */
export const createRouter = (client: QueryClient) =>
  createBrowserRouter([
    {
      errorElement: <PageProblem />,
      hydrateFallbackElement: <Opening />,
      children: routes({ ...AT_THE_DOOR, ...FULL_PAGE }, client),
    },
    {
      element: <AppShell />,
      hydrateFallbackElement: <Opening />,
      children: [{ errorElement: <PageProblem />, children: routes(IN_THE_HOUSE, client) }],
    },
    { path: '*', element: <PageProblem /> },
  ]);
