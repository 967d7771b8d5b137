import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseCatalogue } from './catalogue.js';
import { normaliseDesignation, suggestDesignations } from './designation.js';

const seeds = join(__dirname, '../../../../seeds/sections');
const names = ['i.csv', 'channel.csv', 'tee.csv', 'angle.csv', 'rectangular-hollow.csv', 'circular-hollow.csv'];
const catalogue = parseCatalogue(names.map((name) => ({ name, text: readFileSync(join(seeds, name), 'utf8') })));
const designations = catalogue.map((s) => s.designation);

describe('normaliseDesignation', () => {
  /** Spellings met in steel schedules: *common practice*. Each line names one section. */
  it.each([
    ['UB 254x146x31', ['254 x 146 x 31 UB', '254*146*31UB', 'UKB 254x146x31', 'ub254×146×31', 'UB\u00a0254\u00a0x\u00a0146\u00a0x\u00a031', '254x146UB31', 'UB 254-146-31', '254 x 146 x 31 kg/m UB', 'UB 254 X 146 X 31.0']],
    ['UC 203x203x46', ['203x203x46 UKC', '203 UC 203 46', 'uc203x203x46']],
    ['IPE 300', ['IPE300', 'ipe 300', 'IPE-300', '300 IPE']],
    ['IPE A 300', ['IPEA 300', 'IPE 300 A', 'IPE A300']],
    ['HEB 300', ['HE 300 B', 'HE300B', 'HEB300', 'HE-B 300', 'HE B 300', 'IPB 300', 'he 300b']],
    ['HEA 300', ['HE300A', 'HE 300 A', 'IPBl 300']],
    ['HEAA 200', ['HE 200 AA', 'HE200AA']],
    ['HEM 300', ['HE 300 M', 'IPBv 300']],
    ['SHS 150x150x6.3', ['150x150x6.3 SHS', 'SHS 150x6.3', 'SHS150*150*6,3', 'SHS 150x150x6.30', 'RHS 150x150x6.3', 'HFSHS 150 x 150 x 6.3', 'shs 150 × 6,30 mm']],
    ['RHS 200x100x8', ['RHS 200×100×8,0', '200x100x8.0 RHS', 'RHS 100x200x8', 'RHS 200 100 8']],
    ['CHS 168.3x6.3', ['CHS 168.3*6.3', 'CHS 168,3 x 6,3', 'CHS Ø168.3×6.3', '168.3x6.3 CHS', 'CHS 168.30x6.30mm']],
    ['L 100x100x10', ['100x100x10 RSA', 'L100x10', 'L 100.100.10'.replaceAll('.', '*'), '100x100x10 UKA', '100 x 100 x 10 EA']],
    ['L 150x90x10', ['L 90x150x10', '150x90x10 UA']],
    ['UPN 200', ['UNP 200', 'UNP200', 'upn200']],
    ['PFC 200x90x30', ['200x90x30 PFC', 'UKPFC 200x90x30']],
    ['W310x38.7', ['W12x26', 'W 12 X 26', 'W 310 × 38,7']],
    ['HSS152.4x152.4x6.4', ['HSS6x6x1/4', 'HSS 6 x 6 x 1/4']],
    ['HSS38.1x38.1x3.2', ['HSS1-1/2x1-1/2x1/8', 'hss 1-1/2 x 1-1/2 x 1/8']],
  ])('%s', (designation, spellings) => {
    const keys = new Map<string, string>();
    for (const s of catalogue) for (const name of [s.designation, ...s.otherNames]) keys.set(normaliseDesignation(name), s.designation);
    expect(spellings.map((spelling) => [spelling, keys.get(normaliseDesignation(spelling))])).toEqual(spellings.map((s) => [s, designation]));
  });

  it('gives every designation and every other name of the catalogue a key of its own', () => {
    const owners = new Map<string, Set<string>>();
    for (const s of catalogue) {
      for (const name of [s.designation, ...s.otherNames]) {
        const key = normaliseDesignation(name);
        owners.set(key, (owners.get(key) ?? new Set()).add(s.designation));
      }
    }
    expect(owners.size).toBeGreaterThan(3500);
    expect([...owners].filter(([, sections]) => sections.size > 1)).toEqual([]);
  });

  it('is steady: a key is its own key', () => {
    for (const name of designations) expect(normaliseDesignation(normaliseDesignation(name))).toBe(normaliseDesignation(name));
  });

  it('keeps apart what differs', () => {
    const differ = [['IPE 300', 'IPE A 300'], ['HEA 300', 'HEAA 300'], ['UB 254x146x31', 'UC 254x146x31'], ['SHS 100x10', 'SHS 100x100'], ['CHS 100x10', 'SHS 100x10'], ['CFSHS 100x100x5', 'SHS 100x100x5']];
    for (const [a, b] of differ) expect(normaliseDesignation(a!)).not.toBe(normaliseDesignation(b!));
    expect(['', ' ', '—', '()'].map(normaliseDesignation)).toEqual(['', '', '', '']);
  });
});

describe('suggestDesignations', () => {
  it.each([
    ['UB 254x146x32', 'UB 254x146x31'],
    ['IPE 310', 'IPE 300'],
    ['HE 300 BB', 'HEB 300'],
    ['SHS 150x150x6.2', 'SHS 150x150x6.3'],
    ['UB 245x146x31', 'UB 254x146x31'],
  ])('for %s offers %s among three', (slip, meant) => {
    expect(suggestDesignations(slip, designations, 3)).toContain(meant);
  });

  it('offers the known section itself first, no more than asked for, and nothing for what is no section', () => {
    expect(suggestDesignations('ipe300', designations, 4)[0]).toBe('IPE 300');
    expect(suggestDesignations('UB 254x146x32', designations, 2)).toHaveLength(2);
    expect(suggestDesignations('timber post, see note', designations, 3)).toEqual([]);
    expect(suggestDesignations('', designations, 3)).toEqual([]);
  });
});
