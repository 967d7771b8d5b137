import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { BuildingDto, IssuedBuildingDto } from '@mantlet/common';
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
    expect(screen.getByRole('link', { name: /B1 has no actions/ })).toHaveAttribute('href', `/projects/${projectId}/members/${memberId}`);
    expect(within(screen.getByRole('region', { name: 'Waits on you' })).getByRole('link', { name: /B1 has no actions/ })).toBeInTheDocument();
    expect(document.title).toBe('Building · Test house · Mantlet');
  });
  it('says what to do first in an empty project', async () => {
    serve({ [path]: { body: { members: 0, settled: 0, open: 0, levels: [], openItems: [], protection: [] } satisfies BuildingDto }, [`GET /projects/${projectId}/zones`]: { body: [] }, [`GET /projects/${projectId}/memberships`]: { body: [] } });
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
  it('reads out a zone pointed at, and marks its line in the list', async () => {
    serve({ [path]: { body: building } });
    renderPage(<BuildingPage />, { project: testProject(['specifier']) });
    const zone = await screen.findByRole('link', { name: /Zone Z01 Hall/ });
    fireEvent.focus(zone);
    expect(screen.getByText(/^Zone Z01 Hall, level L0: R 60/)).toBeInTheDocument();
    expect(screen.getByRole('link', { name: /B1 has no actions/ }).closest('li')).toHaveClass('mt-keynote-on');
  });
  it('shows those without a design role the building as issued, and asks for nothing else', async () => {
    const issued: IssuedBuildingDto = {
      revision: { id: 'r', code: 'P01', issuedAt: '2026-03-02T09:00:00Z' }, members: 12, protectedMembers: 11, bareMembers: 1, protectedAreaM2: 80.4,
      levels: [{ id: 'l', code: 'L0', name: 'Ground', elevationM: 0, heightM: 4, zones: [{ id: zoneId, code: 'Z01', name: 'Hall', periodMin: 60, curve: 'standard', protectedAreaM2: 80.4, members: 12, protectedMembers: 11, bareMembers: 1 }] }],
    };
    const calls = serve({ [`GET /projects/${projectId}/site/building`]: { body: issued } });
    renderPage(<BuildingPage />, { project: testProject(['contractor']) });
    expect(await screen.findByRole('heading', { level: 1, name: 'P01: 11 members to protect, 80 m²; 1 stays bare' })).toBeInTheDocument();
    expect(screen.getByRole('link', { name: /Zone Z01 Hall, level L0: R 60, 80 m² to protect, 11 of 12 members protected/ })).toHaveAttribute('href', `/projects/${projectId}/site#zone-${zoneId}`);
    expect(calls.map((c) => c.path)).toEqual([`/projects/${projectId}/site/building`]);
  });
  it('says that nothing is issued yet', async () => {
    serve({ [`GET /projects/${projectId}/site/building`]: { body: { revision: null, members: 0, protectedMembers: 0, bareMembers: 0, protectedAreaM2: 0, levels: [] } satisfies IssuedBuildingDto } });
    renderPage(<BuildingPage />, { project: testProject(['reader']) });
    expect(await screen.findByRole('heading', { level: 1, name: 'Nothing has been issued yet' })).toBeInTheDocument();
  });
});
