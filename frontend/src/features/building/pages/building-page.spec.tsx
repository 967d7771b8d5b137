import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { BuildingDto } from '@mantlet/common';
import { projectId, renderPage, serve, testProject } from '../../../test/render.js';
import BuildingPage from './building-page.js';

const zoneId = '44444444-4444-4444-8444-444444444444';
const memberId = '55555555-5555-4555-8555-555555555555';
const building: BuildingDto = {
  members: 12, settled: 10, open: 2,
  levels: [{ id: 'l', code: 'L0', name: 'Ground', elevationM: 0, heightM: 4, zones: [{ id: zoneId, code: 'Z01', name: 'Hall', periodMin: 60, curve: 'standard', protectedAreaM2: 80.5, members: 12, settled: 10, open: 2, issuedMembers: 0 }] }],
  openItems: [{ role: 'structural-engineer', kind: 'blocker', code: 'x', title: 'B1 has no actions', zoneId, zoneLabel: 'Z01 Hall', memberIds: [memberId], count: 1, page: 'member' }],
  protection: [{ label: 'Coating', kind: 'coating', members: 10, areaM2: 80.5, net: '61 L' }],
};
const path = `GET /projects/${projectId}/building`;

describe('the building page', () => {
  it('answers in its heading, and links every zone and open item to its place', async () => {
    serve({ [path]: { body: building } });
    renderPage(<BuildingPage />, { project: testProject(['structural-engineer']) });
    expect(await screen.findByRole('heading', { level: 1, name: '10 of 12 members settled' })).toBeInTheDocument();
    const zone = screen.getByRole('link', { name: /Zone Z01 Hall, level L0: R 60, 81 m² protected, 10 of 12 members settled, 2 open/ });
    expect(zone).toHaveAttribute('href', `/projects/${projectId}/zones?zone=${zoneId}`);
    expect(screen.getByRole('link', { name: 'B1 has no actions' })).toHaveAttribute('href', `/projects/${projectId}/members/${memberId}`);
    expect(screen.getByText('You')).toBeInTheDocument();
    expect(document.title).toBe('Building · Test house · Mantlet');
  });
  it('says what to do first in an empty project', async () => {
    serve({ [path]: { body: { members: 0, settled: 0, open: 0, levels: [], openItems: [], protection: [] } satisfies BuildingDto }, [`GET /projects/${projectId}/zones`]: { body: [] } });
    renderPage(<BuildingPage />, { project: testProject(['fire-engineer']) });
    expect(await screen.findByRole('heading', { name: 'Draw up the levels' })).toBeInTheDocument();
    expect(screen.getByRole('heading', { level: 1, name: 'No levels yet' })).toBeInTheDocument();
  });
  it('shows a failure as a sentence with a way to try again', async () => {
    serve({ [path]: { status: 400, body: { message: 'The building cannot be drawn.' } } });
    renderPage(<BuildingPage />, { project: testProject(['specifier']) });
    expect(await screen.findByText('The building cannot be drawn.')).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Try again' })).toBeInTheDocument();
  });
  it('sends those who see issued work only to the site page', async () => {
    const calls = serve({});
    const { router } = renderPage(<BuildingPage />, { project: testProject(['contractor']), path: '/projects/:projectId', at: `/projects/${projectId}` });
    await screen.findByText('elsewhere');
    expect(router.state.location.pathname).toBe(`/projects/${projectId}/site`);
    expect(calls).toEqual([]);
  });
});
