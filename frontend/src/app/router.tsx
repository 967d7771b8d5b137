import type { ComponentType } from 'react';
import { createBrowserRouter, Navigate } from 'react-router-dom';
import type { RouteObject } from 'react-router-dom';
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

export const routes: RouteObject[] = [
  {
    errorElement: <RouteFault />,
    hydrateFallbackElement: <LoadingState what="Mantlet" />,
    children: [
      page('/sign-in', () => import('../features/session/pages/sign-in-page.js')),
      page('/set-up', () => import('../features/session/pages/set-up-page.js')),
      {
        element: <RequireSession />,
        children: [
          { path: '/', element: <Navigate to="/projects" replace /> },
          { path: '/projects/:projectId', element: <ProjectLayout />, children: [guarded([...projectPages, { path: '*', element: <NotFound /> }])] },
          {
            element: <Shell />,
            children: [guarded([
              page('/projects', () => import('../features/projects/pages/projects-page.js')),
              page('/products', () => import('../features/products/pages/products-page.js')),
              page('/products/:productId', () => import('../features/products/pages/product-page.js')),
              page('/help', () => import('../features/help/pages/help-page.js')),
              page('/accounts', () => import('../features/team/pages/accounts-page.js')),
              { path: '*', element: <NotFound /> },
            ])],
          },
        ],
      },
    ],
  },
];
export const createRouter = () => createBrowserRouter(routes);
