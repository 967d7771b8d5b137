import { message } from '@mantlet/common';
import type { ImportMapping } from '@mantlet/common';
import { compareRow } from './compare.js';
import type { Namer, StandingMember } from './compare.js';
import type { ReadRow } from './read-row.js';

const namer: Namer = { zone: (id) => id.toUpperCase(), levelOf: (id) => (id === 'z9' ? '09' : '00'), section: (id) => `Section ${id}` };
const none: ImportMapping['defaults'] = { zoneId: null, memberType: null, grade: null, exposure: null, protectionForm: null };
const all: ImportMapping['defaults'] = { zoneId: 'z1', memberType: 'column', grade: 'S275', exposure: 'four-sides', protectionForm: 'boxed' };
const standing: StandingMember = {
  id: 'm', mark: 'B1', zoneId: 'z1', memberType: 'beam', sectionId: 's1', grade: 'S355', lengthMm: 6000, quantity: 3,
  exposure: { arrangement: 'given-faces', faces: ['left', 'bottom'], reason: 'in the wall' }, protectionForm: 'profile', note: 'n', basis: { way: 'none' },
};
const row = (draft: ReadRow['draft'], problems: ReadRow['problems'] = []): ReadRow => ({ row: 2, mark: 'B1', values: {}, draft, problems });

describe('a row held against the project', () => {
  it('of a new member takes what is left out from the values for all rows, and says what still lacks', () => {
    const made = compareRow(row({ sectionId: 's1', lengthMm: 5000 }), null, all, namer);
    expect(made).toMatchObject({
      state: 'new', problems: [],
      target: { zoneId: 'z1', memberType: 'column', grade: 'S275', quantity: 1, exposure: { arrangement: 'four-sides', reason: '' }, protectionForm: 'boxed', note: '' },
    });
    const lacking = compareRow(row({ sectionId: 's1' }), null, { ...none, grade: 'S275' }, namer);
    expect(lacking).toMatchObject({ state: 'wrong', target: null });
    expect(lacking.problems.map((p) => p.field)).toEqual(['zone', 'memberType', 'length', 'exposure', 'protectionForm']);
  });

  it('does not complain twice of what was said wrongly', () => {
    const wrong = compareRow(row({ sectionId: 's1' }, [{ field: 'length', reason: message('import.row-not-a-number', { text: 'x', field: 'Length' }) }]), null, all, namer);
    expect(wrong.problems).toHaveLength(1);
  });

  it('of a member that is there keeps what it leaves out, whatever the values for all rows', () => {
    expect(compareRow(row({}), standing, all, namer)).toMatchObject({ state: 'unchanged', changes: [] });
    expect(compareRow(row({ exposure: { arrangement: 'given-faces', faces: ['bottom', 'left'] }, lengthMm: 6000.0004 }), standing, all, namer).state).toBe('unchanged');
  });

  it('shows each change from what to what', () => {
    const changed = compareRow(
      row({ zoneId: 'z2', sectionId: 's2', lengthMm: 6500.5, exposure: { arrangement: 'three-sides' }, basis: { way: 'utilisation', mu0: 0.6, reference: 'C1' } }), standing, none, namer);
    expect(changed.changes).toEqual([
      { field: 'zone', old: 'Z1', new: 'Z2' }, { field: 'section', old: 'Section s1', new: 'Section s2' }, { field: 'length', old: '6000 mm', new: '6500.5 mm' },
      { field: 'exposure', old: 'Faces: left, bottom', new: 'Three sides, slab on top' }, { field: 'utilisation', old: 'Not given', new: 'Utilisation in fire 0.6 (C1)' },
    ]);
    // the reason was given for the faces of before
    expect(changed.target?.exposure).toEqual({ arrangement: 'three-sides', reason: '' });
    const again = compareRow(row({ basis: { way: 'declared', temperatureC: 550, reference: 'C1' } }), { ...standing, basis: { reference: 'C1', temperatureC: 550, way: 'declared' } }, none, namer);
    expect(again.state).toBe('unchanged');
  });

  it('keeps what is known of a beam that may buckle beside a new utilisation', () => {
    const buckling: StandingMember = { ...standing, basis: { way: 'utilisation', mu0: 0.5, mayBuckle: true, reference: 'C1' } };
    const changed = compareRow(row({ basis: { way: 'utilisation', mu0: 0.6, reference: 'C2' } }), buckling, none, namer);
    expect(changed.basis).toEqual({ way: 'utilisation', mu0: 0.6, mayBuckle: true, reference: 'C2' });
    expect(changed.changes).toEqual([{ field: 'utilisation', old: 'Utilisation in fire 0.5, may buckle (C1)', new: 'Utilisation in fire 0.6, may buckle (C2)' }]);
    expect(compareRow(row({ basis: { way: 'utilisation', mu0: 0.6, reference: 'C2' } }), standing, none, namer).basis).not.toHaveProperty('mayBuckle');
  });

  it('is answered by the member, or the zone for all rows, where it names only a level of several zones or faces without names', () => {
    const unclear = [{ field: 'level' as const, reason: message('import.row-zone-unclear', { level: '00', zones: ['Z1', 'Z2'] }) }];
    expect(compareRow(row({}, unclear), standing, none, namer).state).toBe('unchanged');
    expect(compareRow(row({}, unclear), { ...standing, zoneId: 'z9' }, none, namer).state).toBe('wrong');
    expect(compareRow(row({ sectionId: 's1', lengthMm: 5000 }, unclear), null, all, namer).state).toBe('new');
    expect(compareRow(row({ sectionId: 's1', lengthMm: 5000 }, unclear), null, { ...all, zoneId: null }, namer).problems).toHaveLength(1);
    const faces = [{ field: 'exposure' as const, reason: message('import.row-faces', { text: 'Faces as given' }) }];
    expect(compareRow(row({}, faces), standing, none, namer).state).toBe('unchanged');
    expect(compareRow(row({}, faces), { ...standing, exposure: { arrangement: 'four-sides', reason: '' } }, none, namer).state).toBe('wrong');
  });
});
