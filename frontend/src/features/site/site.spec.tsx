import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { SiteDto, SiteItemDto, SiteMaterialDto } from '@mantlet/common';
import { projectId, renderPage, serve, testProject } from '../../test/render.js';
import SitePage from './pages/site-page.js';
import { groupItems, howThick, materialWords, shownLevels, siteHeading } from './site-words.js';

const item = (more: Partial<SiteItemDto> = {}): SiteItemDto => ({
  mark: 'B1', section: 'IPE 300', memberType: 'beam', quantity: 2, lengthMm: 6000, faces: 'Three sides, slab on top', productName: 'Coat', kind: 'coating', thickness: '620 µm', wetThickness: '886 µm', coats: 2, layers: null, areaM2: '10.10', litres: '11.05', ...more,
});
const material = (more: Partial<SiteMaterialDto> = {}): SiteMaterialDto => ({
  thickness: null, productName: 'Coat', kind: 'coating', areaM2: '20.20', litres: '22.10', containers: 2, kg: '28.73', sheets: null, sheetSize: null, wastePercent: null, sheetM2: null, volumeM3: '0.0125', bags: null, money: null, ...more,
});
const site: SiteDto = {
  project: { number: 'T-001', name: 'Test house', place: 'Nowhere', currency: 'EUR' }, revision: { id: 'r1', code: 'P02', issuedAt: '2026-05-02T08:00:00Z', pdfSha256: 'ab'.repeat(32), pdfAvailable: true }, prices: false,
  purchase: [material()], levels: [{
    id: 'l1', code: 'L1', name: 'First', elevationM: 4.2, materials: [material({ containers: null })], purchase: [],
    zones: [{ id: 'z1', code: 'Z01', name: 'Hall', periodMin: 60, items: [item(), item({ mark: 'B2', thickness: '700 µm', wetThickness: '1000 µm' })], bare: [{ mark: 'B9', section: 'HE 300 B', memberType: 'beam', quantity: 3 }], materials: [] }],
  }],
};
const empty: SiteDto = { project: null, revision: null, levels: [], purchase: [], prices: false };

describe('how thick', () => {
  it('reads like a gauge for coating, like a stack for board', () => {
    expect(howThick(item())).toBe('620 µm dry, 886 µm wet in 2 coats');
    expect(howThick(item({ wetThickness: null, coats: null }))).toBe('620 µm dry');
    expect(howThick(item({ kind: 'board', thickness: '24 mm (12 + 12)', layers: '12 mm + 12 mm' }))).toBe('24 mm in layers of 12 mm + 12 mm');
    expect(howThick(item({ kind: 'spray', thickness: '34 mm', layers: null }))).toBe('34 mm');
  });
  it('gathers what gets the same, and adds up exactly', () => {
    const groups = groupItems([item(), item({ mark: 'B3', areaM2: '0.20', litres: '0.10' }), item({ mark: 'B2', thickness: '700 µm' })]);
    expect(groups.map((g) => g.items.map((i) => i.mark))).toEqual([['B1', 'B3'], ['B2']]);
    expect(groups[0]).toMatchObject({ areaM2: '10.30', litres: '11.15' });
  });
  it('gives no sum where one litre figure is missing', () => expect(groupItems([item(), item({ mark: 'B3', litres: null })])[0]?.litres).toBeNull());
});

describe('materials in words', () => {
  it.each([
    [material(), '22.1 L, 2 containers, 29 kg'],
    [material({ kind: 'board', litres: null, containers: null, kg: null, sheets: 1, sheetSize: '2500 × 1200 mm', sheetM2: '3.00' }), '1 sheet of 2500 × 1200 mm'],
    [material({ kind: 'spray', litres: null, containers: null, kg: null, bags: 3, volumeM3: '0.1500' }), '0.15 m³, 3 bags'],
    [material({ litres: null, containers: null, kg: null }), 'not determined'],
  ])('%#', (m, words) => expect(materialWords(m)).toBe(words));
  it('heads the page', () => {
    expect(siteHeading(site)).toBe('P02: 22 L of coating');
    expect(siteHeading(empty)).toBe('Nothing has been issued yet');
  });
  it('shows all floors for one that is not there', () => expect(shownLevels(site.levels, 'gone')).toHaveLength(1));
});

describe('the site page', () => {
  it('shows what to apply where, what stays bare, and the PDF', async () => {
    serve({ [`GET /projects/${projectId}/site`]: { body: site } });
    renderPage(<SitePage />, { project: testProject(['contractor']) });
    const zone = await screen.findByRole('region', { name: /Z01 Hall/ });
    expect(within(zone).getByText('620 µm dry, 886 µm wet in 2 coats')).toBeInTheDocument();
    expect(within(zone).getByRole('rowheader', { name: 'B2' })).toBeInTheDocument();
    expect(within(zone).getByText(/B9 ×3 \(HE 300 B\)/)).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Specification PDF' })).toHaveAttribute('href', `/api/projects/${projectId}/revisions/r1/pdf?download=1`);
    expect(screen.queryByRole('columnheader', { name: 'EUR' })).toBeNull();
  });
  it('shows an inspector what to hold the work against, and nothing to buy', async () => {
    serve({ [`GET /projects/${projectId}/site`]: { body: site } });
    renderPage(<SitePage />, { project: testProject(['inspector']) });
    expect(await screen.findByRole('heading', { level: 1, name: 'P02: 4 pieces to be protected in 1 zone, 3 to stay bare' })).toBeInTheDocument();
    expect(screen.queryByText('To buy for the whole job')).toBeNull();
    expect(screen.getByText(/coating found on them is a deviation to report/)).toBeInTheDocument();
  });
  it('prints what is shown', async () => {
    const two = { ...site, levels: [...site.levels, { ...site.levels[0] as SiteDto['levels'][number], id: 'l2', code: 'L2' }] };
    serve({ [`GET /projects/${projectId}/site`]: { body: two } });
    renderPage(<SitePage />, { project: testProject(['contractor']), at: `/projects/${projectId}/site?level=l2` });
    expect(await screen.findByRole('button', { name: 'Print this floor' })).toBeInTheDocument();
    expect(screen.getAllByRole('heading', { level: 2 }).map((h) => h.textContent)).toEqual(['L2 First, +4.200 m']);
  });
  it('says that nothing has been issued, and sends no contractor to pages that are not theirs', async () => {
    serve({ [`GET /projects/${projectId}/site`]: { body: empty } });
    renderPage(<SitePage />, { project: testProject(['contractor']) });
    expect(await screen.findByRole('heading', { level: 1, name: 'Nothing has been issued yet' })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Go to the schedule' })).toBeNull();
  });
});
