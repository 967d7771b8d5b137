import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { BuildingDto, ProjectListItemDto } from '@mantlet/common';
import { projectId, renderPage, serve } from '../../../test/render.js';
import ProjectsPage from './projects-page.js';

const project = (more: Partial<ProjectListItemDto> = {}): ProjectListItemDto => ({
  id: projectId, number: 'T-001', name: 'Test house', place: 'Nowhere', roles: ['specifier'], revision: { code: 'P02', state: 'draft' }, members: 12, protectedAreaM2: 80.4, open: 2, waitsOnMe: 1, ...more,
});
const building: BuildingDto = {
  members: 12, settled: 10, open: 2, levels: [], protection: [],
  openItems: [
    { role: 'structural-engineer', kind: 'blocker', code: 'x', title: 'B1 has no actions', zoneId: null, zoneLabel: null, memberIds: [], count: 1, page: 'members' },
    { role: 'specifier', kind: 'blocker', code: 'y', title: 'B2 is outside the assessment', zoneId: null, zoneLabel: 'Z01 Hall', memberIds: ['m2'], count: 1, page: 'member' },
  ],
};
const show = (rows: ProjectListItemDto[]) => {
  const calls = serve({ 'GET /projects': { body: rows }, [`GET /projects/${projectId}/building`]: { body: building } });
  renderPage(<ProjectsPage />, { path: '/projects', at: '/projects' });
  return calls;
};

describe('the projects page', () => {
  it('gives each of few projects a sheet, with what waits on the reader and where it is settled', async () => {
    show([project()]);
    expect(await screen.findByRole('heading', { level: 1, name: 'One item waits on you' })).toBeInTheDocument();
    expect(await screen.findByRole('link', { name: 'B2 is outside the assessment' })).toHaveAttribute('href', `/projects/${projectId}/members/m2`);
    expect(screen.queryByText('B1 has no actions')).not.toBeInTheDocument();
    expect(screen.getByText('P02 draft')).toBeInTheDocument();
  });
  it('says that a revision waits for a signature where nothing else does', async () => {
    show([project({ roles: ['fire-engineer', 'specifier'], waitsOnMe: 2 })]);
    expect(await screen.findByRole('link', { name: 'and 1 more' })).toBeInTheDocument();
  });
  it('asks for the issued building only where one sees nothing else, and shows dashes before an issue', async () => {
    const calls = show([project({ roles: ['contractor'], revision: null, members: null, protectedAreaM2: null, open: null, waitsOnMe: 0 })]);
    expect(await screen.findByText('Nothing waits on you here')).toBeInTheDocument();
    expect(screen.getAllByText('nothing is issued yet')).toHaveLength(2);
    expect(calls.map((c) => c.path)).not.toContain(`/projects/${projectId}/building`);
  });
  it('sets many projects as a table, without asking for their buildings', async () => {
    const calls = show(Array.from({ length: 5 }, (_, i) => project({ id: `${projectId.slice(0, -1)}${i}`, name: `House ${i}` })));
    expect(await screen.findByRole('link', { name: 'House 4' })).toBeInTheDocument();
    expect(calls.filter((c) => c.path.endsWith('/building'))).toEqual([]);
  });
});
