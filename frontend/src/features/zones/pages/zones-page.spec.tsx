import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import type { LevelDto, Role, ZoneDto } from '@mantlet/common';
import { projectId, renderPage, serve, testProject } from '../../../test/render.js';
import { commonCurve, inPlace, treeRows } from '../components/zone-tree.js';
import ZonesPage, { zonesWords } from './zones-page.js';

const id = (n: number) => `33333333-3333-4333-8333-${String(n).padStart(12, '0')}`;
const levels: LevelDto[] = [
  { id: id(1), code: 'L0', name: 'Ground', elevationM: 0, heightM: 4, version: 1 },
  { id: id(2), code: 'L1', name: 'First', elevationM: 4, heightM: 4, version: 2 },
];
const zone = (n: number, code: string, levelId: string, more: Partial<ZoneDto> = {}): ZoneDto => ({
  id: id(n), levelId, code, name: `Room ${code}`, periodMin: 60, curve: { kind: 'standard' }, reference: '', environment: 'C1', targetPolicy: { policy: 'own' },
  version: 5, systems: [], members: 3, settled: 3, open: 0, protectedAreaM2: 10, targets: [], ...more,
});
const zones = [zone(11, 'Z10', id(1)), zone(12, 'Z2', id(1), { open: 1, periodMin: 90 }), zone(13, 'Z3', id(2))];
const at = `/projects/${projectId}`;
const answers = { [`GET ${at}/levels`]: { body: levels }, [`GET ${at}/zones`]: { body: zones }, [`GET ${at}/products`]: { body: [] } };
const open = (roles: Role[], more: Parameters<typeof serve>[0] = {}) => {
  const calls = serve({ ...answers, ...more });
  renderPage(<ZonesPage />, { project: testProject(roles) });
  return calls;
};

describe('the zones page', () => {
  it('lists levels from the top, each with its zones in the order of their codes', () => {
    expect(treeRows(levels, zones).map((r) => (r.kind === 'level' ? r.level.code : r.zone.code))).toEqual(['L1', 'Z3', 'L0', 'Z2', 'Z10']);
  });
  it('answers in its heading', () => {
    expect(zonesWords(levels, zones)).toEqual({ heading: '3 zones on 2 levels, 60 to 90 minutes', sub: 'Standard fire throughout. One zone has members open. Three have no protection system yet.' });
    expect(zonesWords([], []).heading).toBe('No levels yet');
  });
  it('names a curve once only where every zone has it', () => {
    expect(commonCurve(zones)).toBe('standard');
    expect(commonCurve([...zones, zone(14, 'Z4', id(2), { curve: { kind: 'hydrocarbon' } })])).toBeNull();
    expect(commonCurve([])).toBeNull();
  });
  it('compares boards by volume, since sheet area counts layers', () => {
    expect(inPlace({ policy: 'own', thicknesses: [24], material: 102, materialUnit: 'm²', volumeM3: 1.22 })).toEqual({ value: 1.22, unit: 'm³', decimals: 2 });
    expect(inPlace({ policy: 'own', thicknesses: [1.2], material: 102, materialUnit: 'L', volumeM3: 0.1 })).toEqual({ value: 102, unit: 'L', decimals: 0 });
    expect(inPlace(undefined).value).toBeNull();
  });
  it('lets the fire engineer edit levels and zones, and not the protection', async () => {
    open(['fire-engineer']);
    expect(await screen.findByRole('button', { name: 'Edit zone Z3' })).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Add level' })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Protection of zone Z3' })).not.toBeInTheDocument();
    expect(screen.getByText(/Only the specifier may choose environment/)).toBeInTheDocument();
  });
  it('lets the specifier set the protection, and nothing else', async () => {
    open(['specifier']);
    expect(await screen.findByRole('button', { name: 'Protection of zone Z3' })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Edit zone Z3' })).not.toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Add level' })).not.toBeInTheDocument();
    expect(screen.getByText(/Only the fire engineer may change zones/)).toBeInTheDocument();
  });
  it('opens the zone of the address and takes the focus there; says so where there is none', async () => {
    serve(answers);
    const { unmount } = renderPage(<ZonesPage />, { project: testProject(['specifier']), at: `${at}/zones?zone=${id(12)}` });
    expect(await screen.findByText(/No reference says where the period comes from/)).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Z2 Room Z2' })).toHaveFocus();
    unmount();
    renderPage(<ZonesPage />, { project: testProject(['specifier']), at: `${at}/zones?zone=${id(99)}` });
    expect(await screen.findByText(/is not on this project; it may have been deleted/)).toBeInTheDocument();
  });
  it('asks nothing of the server for a reader, and says who may see it', async () => {
    const calls = open(['reader']);
    expect(await screen.findByText(/may see work in progress/)).toBeInTheDocument();
    expect(calls).toEqual([]);
  });
  it('keeps what was typed when somebody else saved first, and sends the version it was opened with', async () => {
    const said = 'Somebody else saved this zone after you opened it. Compare the two versions and save again.';
    const calls = open(['fire-engineer'], { [`PATCH ${at}/zones/${id(12)}`]: { status: 409, body: { message: said, code: 'shared.stale', issues: [], current: { ...zones[1], name: 'Tea room', version: 6 }, by: 'Ida Holm', at: '2026-03-02T09:00:00.000Z' } } });
    await userEvent.click(await screen.findByRole('button', { name: 'Edit zone Z2' }));
    const drawer = await screen.findByRole('dialog', { name: /Zone Z2/ });
    const name = within(drawer).getByLabelText('Name');
    await userEvent.clear(name);
    await userEvent.type(name, 'Kitchen');
    await userEvent.click(within(drawer).getByRole('button', { name: 'Save' }));
    await within(drawer).findByRole('table');
    expect(name).toHaveValue('Kitchen');
    expect(calls.find((c) => c.method === 'PATCH')?.body).toMatchObject({ name: 'Kitchen', periodMin: 90, version: 5 });
    const table = within(await within(drawer).findByRole('table', { name: 'Fields in which the two versions differ' }));
    expect(table.getByRole('radio', { name: 'Name: Yours, Kitchen' })).not.toBeChecked();
    expect(table.getByRole('radio', { name: /^Name: Ida Holm, .*Tea room$/ })).not.toBeChecked();
  });
});
