import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import type { MemberRowDto, MemberSheetDto, Role } from '@mantlet/common';
import { projectId, renderPage, serve, testProject } from '../../../test/render.js';
import MemberPage from './member-page.js';
import MembersPage from './members-page.js';

const memberId = '22222222-2222-4222-8222-222222222222';
const at = `/projects/${projectId}/members`;
const sheet: MemberSheetDto = {
  member: {
    id: memberId, version: 4, zoneId: projectId, mark: 'B2-014', memberType: 'beam', sectionId: projectId, grade: 'S355', family: 'UB', periodMin: 60, note: '', utilisation: null, lengthMm: 7500, quantity: 2,
    exposure: { arrangement: 'three-sides', reason: 'concrete slab' }, protectionForm: 'profile', coatBackConnections: 0, coatBackGirthMm: 0, deductionM2: 0, onSite: true, note: '',
    basis: { way: 'none' }, basisSetBy: null, basisSetAt: null, acceptances: [],
  },
  section: {
    id: projectId, projectId: null, family: 'UB', designation: 'UB 457x191x67', otherNames: [], standard: '', shape: { kind: 'i', hMm: 453.4, bMm: 189.9, twMm: 8.5, tfMm: 12.7, rootRadiusMm: 10.2 },
    properties: { areaMm2: 8551, massKgPerM: 67.1, perimeterMm: 1632, iyMm4: 1, izMm4: 1, welYMm3: 1, welZMm3: 1, wplYMm3: 1, wplZMm3: 1, itMm4: 1, iwMm6: 1, shearAreaZMm2: 1 },
  },
  zone: { id: projectId, code: 'Z07', name: 'Local history', periodMin: 90, curve: 'standard' }, level: { id: projectId, code: 'L2', name: 'Second floor' },
  productName: null, result: null, sentence: 'Not determined: no actions given', areaM2: null, outline: null, charts: null, history: [], previousId: null, nextId: null,
  working: [{ what: 'Section factor', equation: 'A_m/V = A_m/A·1000', inputs: [{ symbol: 'A_m', value: 1442, unit: 'mm' }, { symbol: 'A', value: 8551, unit: 'mm²' }], value: 168.6, unit: '1/m', source: 'EN 1993-1-2 Table 4.2' }],
};
const open = (roles: Role[]) => renderPage(<MemberPage />, { project: testProject(roles), path: '/projects/:projectId/members/:memberId', at: `${at}/${memberId}` });

describe('the sheet of a member', () => {
  it('is headed by its answer, and shows the working with numbers put in', async () => {
    serve({ [`GET ${at}/${memberId}`]: { body: sheet } });
    open(['fire-engineer']);
    expect(await screen.findByRole('heading', { level: 1 })).toHaveTextContent('Not determined: no actions given');
    expect(screen.getByText(/1442\/8551·1000/)).toBeInTheDocument();
    expect(screen.getByRole('heading', { name: 'Critical temperature not determined' })).toBeInTheDocument();
  });
  it.each<[Role, string[], string[]]>([
    ['specifier', ['Change member', 'Delete'], ['Critical temperature', 'Accept']],
    ['structural-engineer', ['Critical temperature'], ['Change member', 'Accept', 'Delete']],
    ['fire-engineer', ['Accept'], ['Change member', 'Critical temperature', 'Delete']],
  ])('offers the %s only what the server would take', async (role, offered, withheld) => {
    serve({ [`GET ${at}/${memberId}`]: { body: sheet } });
    open([role]);
    await screen.findByRole('heading', { level: 1 });
    for (const name of offered) expect(screen.getByRole('button', { name })).toBeInTheDocument();
    for (const name of withheld) expect(screen.queryByRole('button', { name })).toBeNull();
  });
  it('keeps what was typed when somebody else was faster, and offers the saved version', async () => {
    const theirs = { ...sheet.member, version: 5, basis: { way: 'declared', temperatureC: 530, reference: 'Letter' } };
    const calls = serve({
      [`GET ${at}/${memberId}`]: { body: sheet },
      [`PUT ${at}/${memberId}/structural`]: { status: 409, body: { message: 'Ida changed this member meanwhile.', code: 'shared.stale', issues: [], current: theirs, by: 'Ida Holm', at: '2026-03-02T09:00:00.000Z' } },
    });
    open(['structural-engineer']);
    await userEvent.click(await screen.findByRole('button', { name: 'Critical temperature' }));
    const drawer = within(await screen.findByRole('dialog'));
    fireEvent.mouseDown(drawer.getByLabelText('How it comes about'));
    await userEvent.click(await screen.findByTitle('Declared'));
    fireEvent.change(drawer.getByLabelText(/^Critical temperature/), { target: { value: '560' } });
    fireEvent.change(drawer.getByLabelText('Reference'), { target: { value: 'Sheet 12' } });
    await userEvent.click(drawer.getByRole('button', { name: 'Save' }));
    const table = within(await drawer.findByRole('table', { name: 'Fields in which the two versions differ' }));
    expect(table.getByRole('radio', { name: /^Critical temperature: Yours, 560\s°C$/ })).not.toBeChecked();
    expect(table.getByRole('radio', { name: /^Critical temperature: Ida Holm, .*530\s°C$/ })).not.toBeChecked();
    expect(table.getByRole('radio', { name: /^Reference: Yours, Sheet 12$/ })).toBeInTheDocument();
    await userEvent.click(drawer.getByRole('button', { name: 'Back to the form' }));
    expect(drawer.getByLabelText('Reference')).toHaveValue('Sheet 12');
    expect(calls.find((c) => c.method === 'PUT')?.body).toEqual({ basis: { way: 'declared', temperatureC: 560, reference: 'Sheet 12' }, version: 4 });
  });
});

const row: MemberRowDto = {
  id: memberId, mark: 'B2-014', zoneId: projectId, zoneCode: 'Z07', levelCode: 'L2', memberType: 'beam', sectionId: projectId, section: 'UB 457x191x67', grade: 'S355', family: 'UB', periodMin: 60, note: '', utilisation: null, lengthMm: 7500, quantity: 2,
  exposure: 'three-sides', protectionForm: 'profile', way: 'none', verdict: 'not-determined', sectionFactorPerM: 168.6, criticalTemperatureC: null, assumed: false, requiredThickness: null, appliedThickness: null,
  thicknessUnit: null, productName: null, areaM2: null, open: true, sentence: 'Not determined: no actions given', version: 1,
};

describe('the list of members', () => {
  it('keeps its filter in the address and a reader without rights from editing', async () => {
    serve({ [`GET ${at}`]: { body: { items: [row], total: 1, page: 1, pageSize: 100, project: { members: 1, open: 1 } } }, [`GET ${at}/values`]: { body: {} }, [`GET /projects/${projectId}/member-views`]: { body: [] } });
    // rows are drawn for the height that is there, and this document has none of its own
    vi.spyOn(Element.prototype, 'clientHeight', 'get').mockReturnValue(600);
    const { router } = renderPage(<MembersPage />, { project: testProject(['structural-engineer']), path: '/projects/:projectId/members', at });
    expect(await screen.findByRole('link', { name: 'B2-014' })).toHaveAttribute('href', `${at}/${memberId}`);
    expect(screen.getByRole('heading', { level: 1 })).toHaveTextContent('0 of 1 members settled');
    expect(screen.queryByRole('button', { name: 'Add a member' })).toBeNull();
    await userEvent.click(screen.getByRole('link', { name: 'Open' }));
    await waitFor(() => expect(router.state.location.search).toBe('?open=true'));
    await userEvent.click(screen.getByRole('button', { name: 'Clear all' }));
    await waitFor(() => expect(router.state.location.search).toBe(''));
  });
});
