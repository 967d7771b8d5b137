import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { BuildingDto, OpenItemDto, Role } from '@mantlet/common';
import { projectId, renderPage, serve, testProject } from '../../test/render.js';
import { FirstSteps } from './components/first-steps.js';
import { firstSteps } from './first-steps.js';

const open = (code: string, n: number): OpenItemDto => ({ role: 'structural-engineer', kind: 'blocker', code, title: 't', zoneId: null, zoneLabel: null, memberIds: [], count: n, page: 'members' });
const counts = (more: object = {}) => ({ levels: 0, zones: 0, members: 0, products: 0, open: 0, ...more });
const building = (more: Partial<BuildingDto> = {}): BuildingDto => ({ members: 0, settled: 0, open: 0, levels: [], openItems: [], protection: [], ...more });
const fullTeam: { roles: Role[] }[] = [{ roles: ['fire-engineer'] }, { roles: ['structural-engineer'] }, { roles: ['specifier'] }];
const show = (role: Role, b: BuildingDto, more: object = {}, team = fullTeam) => {
  const calls = serve({ [`GET /projects/${projectId}/zones`]: { body: [] }, [`GET /projects/${projectId}/memberships`]: { body: team } });
  const project = testProject([role], { counts: counts(more) });
  renderPage(<FirstSteps project={project} building={b} />, { project });
  return calls;
};
const done = (steps: ReturnType<typeof firstSteps>) => steps.filter((s) => s.done).map((s) => s.key);

describe('the first steps of a project', () => {
  it('count what is there, and what members still wait for', () => {
    expect(done(firstSteps({ counts: counts() }, building(), [], []))).toEqual([]);
    const steps = firstSteps({ counts: counts({ levels: 2, zones: 2 }) }, building({ members: 10, openItems: [open('assessment.no-basis', 4), open('assessment.no-actions', 2), open('assumed', 3)] }), [{ members: 10, systems: [] }, { members: 0, systems: [] }], fullTeam);
    expect(done(steps)).toEqual(['team', 'levels', 'zones', 'members']);
    expect(steps.map((s) => s.state)).toEqual(['3 people', '2 levels', '2 zones', '10 members', '4 of 10 members', 'none yet', '0 of 1 zone']);
  });
  it('offer the next step to whose it is', async () => {
    show('fire-engineer', building());
    expect((await screen.findAllByRole('link', { name: 'Go to the zones' }))[0]).toHaveAttribute('href', `/projects/${projectId}/zones`);
    expect(screen.getByText('Six steps to go. From then on, this page lists what is open.')).toBeInTheDocument();
  });
  it('say on whom it waits to the others', async () => {
    show('structural-engineer', building());
    expect(await screen.findByText('Waits on the fire engineer')).toBeInTheDocument();
    expect(screen.queryByRole('link', { name: 'Go to the zones' })).toBeNull();
    expect(screen.getAllByText('Then the specifier')).toHaveLength(3);
  });
  it('begin with the people whom the other steps need', async () => {
    show('fire-engineer', building(), {}, [{ roles: ['fire-engineer'] }]);
    expect(await screen.findByText(/^Still without a structural engineer and a specifier\. /)).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Go to the team' })).toHaveAttribute('href', `/projects/${projectId}/team`);
  });
  it('are gone once a member is settled, and then ask nothing', async () => {
    const calls = show('specifier', building({ members: 3, settled: 1 }), { levels: 1, zones: 1 });
    expect(screen.queryByText('First steps')).toBeNull();
    expect(calls).toEqual([]);
  });
});
