import { describe, expect, it } from 'vitest';
import { testProject } from '../test/render.js';
import { generalEntries, projectEntries } from './page-list.js';

const labels = (groups: { label: string }[][]) => groups.flat().map((e) => e.label);

describe('the list of pages', () => {
  it('offers all pages to the design roles', () => {
    expect(labels(projectEntries(testProject(['structural-engineer'])))).toEqual(['Building', 'Zones', 'Members', 'Products', 'Quantities', 'Schedule', 'Site', 'Team and basis']);
  });
  it.each(['contractor', 'inspector', 'reader'] as const)('offers issued work only to the %s', (role) => {
    expect(labels(projectEntries(testProject([role])))).toEqual(['Building', 'Site', 'Schedule']);
  });
  it('offers accounts to the administrator only', () => {
    expect(labels(generalEntries(false))).not.toContain('Accounts');
    expect(labels(generalEntries(true))).toContain('Accounts');
  });
});
