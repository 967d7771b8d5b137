import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import type { MembershipDto, Role } from '@mantlet/common';
import { projectId, renderPage, serve, testProject } from '../../../test/render.js';
import TeamPage, { teamWords } from './team-page.js';

const person = (n: number, roles: Role[]): MembershipDto => ({ userId: `u${n}`, name: `Person ${n}`, email: `p${n}@example.org`, roles });
const full = [person(1, ['fire-engineer']), person(2, ['structural-engineer']), person(3, ['specifier']), person(4, ['specifier'])];
const at = `/projects/${projectId}`;
const answers = { [`GET ${at}/memberships`]: { body: full }, [`GET ${at}/audit`]: { body: { items: [], total: 0, page: 1, pageSize: 50 } } };
const panel = (name: string) => screen.getByRole('region', { name });

describe('the team page', () => {
  it('says which role nobody holds, and when nobody could check', () => {
    expect(teamWords(full).sub).toMatch(/somebody else to check/);
    expect(teamWords(full.slice(0, 3)).sub).toMatch(/Only one specifier/);
    expect(teamWords([person(1, ['specifier'])]).sub).toBe('Still without a fire engineer and a structural engineer.');
  });
  it('lets the fire engineer change the design basis, checks it with the contract, and sends every factor', async () => {
    const calls = serve({ ...answers, [`PUT ${at}/design-basis`]: { body: testProject(['fire-engineer'], { version: 2 }) } });
    renderPage(<TeamPage />, { project: testProject(['fire-engineer']) });
    const basis = within(panel('Design basis'));
    const gamma = basis.getByLabelText('γG');
    await userEvent.clear(gamma);
    await userEvent.type(gamma, '9');
    await userEvent.click(basis.getByRole('button', { name: 'Save' }));
    expect(await basis.findByText('γG must be at most 3.')).toBeInTheDocument();
    expect(calls.some((c) => c.method === 'PUT')).toBe(false);
    await userEvent.clear(gamma);
    await userEvent.type(gamma, '1.2');
    await userEvent.click(basis.getByRole('button', { name: 'Save' }));
    await basis.findByText('Saved values.');
    expect(calls.find((c) => c.method === 'PUT')?.body).toMatchObject({ version: 1, designBasis: { gammaG: 1.2, gammaQ: 1.5, psi: { E: { psi1: 0.9 } }, assumedTemperatureC: { column: 550 } } });
    expect(within(panel('Takeoff and issue')).queryByRole('button', { name: 'Save' })).not.toBeInTheDocument();
  });
  it('shows the factors to the others, locked, with the reason', async () => {
    serve(answers);
    renderPage(<TeamPage />, { project: testProject(['structural-engineer']) });
    const basis = within(panel('Design basis'));
    expect(basis.getByLabelText('γG')).toBeDisabled();
    expect(basis.getByLabelText('γG')).toHaveValue('1.35');
    expect(basis.getByText('Only the fire engineer may change the design basis.')).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Add a person' })).not.toBeInTheDocument();
  });
});
