import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import type { ReactElement } from 'react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import type { ProjectDto, Role } from '@mantlet/common';
import { defaultProjectSettings } from '@mantlet/common';
import { vi } from 'vitest';
import { ProjectProvider } from '../features/projects/project-context.js';
import { createQueryClient } from '../lib/query-client.js';
import { PageInfoProvider } from '../ui/page-info.js';
import { LeaveGuard } from '../ui/form/use-unsaved-changes.js';
import { ThemeProvider } from '../ui/theme/theme-provider.js';

export const projectId = '11111111-1111-4111-8111-111111111111';
/** An invented project seen by somebody with these roles. */
export const testProject = (roles: Role[], more: Partial<ProjectDto> = {}): ProjectDto => ({
  id: projectId, number: 'T-001', name: 'Test house', place: 'Nowhere', currency: 'EUR', note: '', version: 1, roles,
  settings: defaultProjectSettings, revision: null, issuedRevision: null, counts: { levels: 0, zones: 0, members: 0, products: 0, open: 0 }, ...more,
});

/** Renders a page inside what the application gives it. path is the route pattern, at the address visited. */
export function renderPage(page: ReactElement, options: { project?: ProjectDto; path?: string; at?: string } = {}) {
  const { project, path = '/projects/:projectId/*', at = `/projects/${project?.id ?? projectId}` } = options;
  const element = <><LeaveGuard />{project ? <ProjectProvider project={project}>{page}</ProjectProvider> : page}</>;
  const router = createMemoryRouter([{ path, element }, { path: '*', element: <p>elsewhere</p> }], { initialEntries: [at] });
  const result = render(
    <QueryClientProvider client={createQueryClient()}>
      <ThemeProvider><PageInfoProvider><RouterProvider router={router} /></PageInfoProvider></ThemeProvider>
    </QueryClientProvider>,
  );
  return { ...result, router };
}

type Answer = { status?: number; body?: unknown };
/** Answers requests by "METHOD /path" without /api and query; keeps what was sent. An unknown request is a 404 with a sentence. */
export function serve(answers: Record<string, Answer | ((body: unknown) => Answer)>) {
  const calls: { method: string; path: string; body: unknown }[] = [];
  vi.stubGlobal('fetch', async (input: string, init: RequestInit = {}) => {
    const method = init.method ?? 'GET';
    const path = input.replace(/^\/api/, '').replace(/\?.*$/, '');
    const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : init.body;
    calls.push({ method, path, body });
    const found = answers[`${method} ${path}`];
    const answer = typeof found === 'function' ? found(body) : found ?? { status: 404, body: { message: `The test answers nothing at ${method} ${path}.` } };
    const status = answer.status ?? 200;
    return new Response(status === 204 ? null : JSON.stringify(answer.body ?? null), { status, headers: { 'content-type': 'application/json' } });
  });
  return calls;
}
