import type { QueryClient } from '@tanstack/react-query';
import type { ComponentType } from 'react';
import { createBrowserRouter, Navigate } from 'react-router-dom';
import type { RouteObject } from 'react-router-dom';
import { projectQuery } from '../features/projects/api/projects.js';
import { sessionQuery } from '../features/session/api/session.js';
import { LoadingState } from '../ui/states.js';
import { NotFound, RouteFault } from './faults.js';
import { ProjectLayout } from './project-layout.js';
import { RequireSession } from './require-session.js';
import { Shell } from './shell.js';

/** A route whose page is fetched when first visited. */
const page = (path: string, load: () => Promise<{ default: ComponentType }>): RouteObject => ({
  path, lazy: async () => ({ Component: (await load()).default }),
});

const projectPages: RouteObject[] = [
  { index: true, lazy: async () => ({ Component: (await import('../features/building/pages/building-page.js')).default }) },
  page('zones', () => import('../features/zones/pages/zones-page.js')),
  page('members', () => import('../features/members/pages/members-page.js')),
  page('members/import', () => import('../features/imports/pages/import-page.js')),
  page('members/:memberId', () => import('../features/members/pages/member-page.js')),
  page('products', () => import('../features/products/pages/products-page.js')),
  page('products/:productId', () => import('../features/products/pages/product-page.js')),
  page('quantities', () => import('../features/quantities/pages/quantities-page.js')),
  page('schedule', () => import('../features/schedule/pages/schedule-page.js')),
  page('schedule/:revisionId', () => import('../features/schedule/pages/revision-page.js')),
  page('site', () => import('../features/site/pages/site-page.js')),
  page('team', () => import('../features/team/pages/team-page.js')),
];

/** A fault inside one page leaves the strip and the list of pages standing. */
const guarded = (children: RouteObject[]): RouteObject => ({ errorElement: <RouteFault />, children });

/**
 * The project is asked for while the session still is, so that no page waits for three answers in a row.
 * Nobody waits here: the layouts show what there is.
 */
const projectRoute = (client: QueryClient): RouteObject => ({
  path: '/projects/:projectId', element: <ProjectLayout />,
  loader: ({ params }) => {
    void client.prefetchQuery(sessionQuery());
    void client.prefetchQuery(projectQuery(params['projectId'] ?? ''));
    return null;
  },
  shouldRevalidate: ({ currentParams, nextParams }) => currentParams['projectId'] !== nextParams['projectId'],
  children: [guarded([...projectPages, { path: '*', element: <NotFound /> }])],
});

const routes = (client: QueryClient): RouteObject[] => [
  {
    errorElement: <RouteFault />,
    hydrateFallbackElement: <LoadingState what="Mantlet" />,
    children: [
      page('/forgotten-password', () => import('../features/session/pages/forgotten-password-page.js')),
      page('/accept-invitation', () => import('../features/session/pages/accept-invitation-page.js')),
      page('/reset-password', () => import('../features/session/pages/reset-password-page.js')),
      page('/caught-mail', () => import('../features/session/pages/caught-mail-page.js')),
      page('/caught-mail/:mailId', () => import('../features/session/pages/caught-mail-page.js')),
      page('/sign-in', () => import('../features/session/pages/sign-in-page.js')),
      page('/set-up', () => import('../features/session/pages/set-up-page.js')),
      {
        element: <RequireSession />,
        children: [
          { path: '/', element: <Navigate to="/projects" replace /> },
          projectRoute(client),
          {
            element: <Shell />,
            children: [guarded([
              page('/projects', () => import('../features/projects/pages/projects-page.js')),
              page('/products', () => import('../features/products/pages/products-page.js')),
              page('/products/:productId', () => import('../features/products/pages/product-page.js')),
              page('/help', () => import('../features/help/pages/help-page.js')),
              page('/account', () => import('../features/session/pages/account-page.js')),
              page('/accounts', () => import('../features/team/pages/accounts-page.js')),
              { path: '*', element: <NotFound /> },
            ])],
          },
        ],
      },
    ],
  },
];
export const createRouter = (client: QueryClient) => createBrowserRouter(routes(client));
