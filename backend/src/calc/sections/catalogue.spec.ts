import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { sectionShapeSchema } from '@mantlet/common';
import { parseCatalogue } from './catalogue.js';
import { sectionProperties } from './properties.js';

const seeds = join(__dirname, '../../../../seeds/sections');
const files = readdirSync(seeds).filter((name) => name.endsWith('.csv')).map((name) => ({ name, text: readFileSync(join(seeds, name), 'utf8') }));
const catalogue = parseCatalogue(files);

describe('parseCatalogue', () => {
  it('reads every section of the shipped files, each a shape the contract allows', () => {
    expect(catalogue).toHaveLength(2959);
    expect(catalogue.filter((s) => !sectionShapeSchema.safeParse(s.shape).success)).toEqual([]);
    expect(catalogue.filter((s) => s.designation.length > 60 || s.standard === '')).toEqual([]);
  });

  it('gives tapered channels the slope of their depth, parallel ones none (DIN 1026-1: 8 % to 300 mm, 5 % above)', () => {
    const slope = (name: string) => {
      const { shape } = catalogue.find((s) => s.designation === name)!;
      return shape.kind === 'channel' ? shape.flangeSlope : null;
    };
    expect(['UPN 300', 'UPN 320', 'UPE 300', 'PFC 300x90x41'].map(slope)).toEqual([0.08, 0.05, 0, 0]);
  });

  it('weighs ASTM A500 sections on the nominal wall and computes them on the design wall (0.93 of it)', () => {
    const hss = catalogue.find((s) => s.designation === 'HSS152.4x152.4x6.4')!;
    expect(hss.otherNames).toEqual(['HSS6x6x1/4']);
    expect(hss.shape).toMatchObject({ kind: 'rectangular-hollow', tMm: 5.92 });
    expect(hss.massKgPerM / sectionProperties(hss.shape).massKgPerM).toBeGreaterThan(1.05);
    const en = catalogue.find((s) => s.designation === 'SHS 150x150x6.3')!;
    expect(en.massKgPerM).toBe(sectionProperties(en.shape).massKgPerM);
  });

  it('says where a file is wrong', () => {
    const heading = 'family,designation,other_names,standard,h_mm,b_mm,tw_mm,tf_mm,root_radius_mm';
    const read = (line: string, name = 'i.csv') => () => parseCatalogue([{ name, text: `${heading}\n${line}\n` }]);
    expect(read('IPE,IPE 300,,EN 10365,300,150,7.1,10.7,15')).not.toThrow();
    expect(read('IPE,IPE 300,,EN 10365,300,150,7.1,10.7')).toThrow('i.csv line 2 has 8 cells for 9 columns.');
    expect(read('IPE,IPE 300,,EN 10365,300,,7.1,10.7,15')).toThrow('i.csv line 2: b_mm is not a number.');
    expect(read('XYZ,IPE 300,,EN 10365,300,150,7.1,10.7,15')).toThrow('there is no family XYZ');
    expect(read('IPE,,,EN 10365,300,150,7.1,10.7,15')).toThrow('the designation is missing');
    expect(read('IPE,IPE 300,,EN 10365,20,150,7.1,10.7,15')).toThrow('i.csv line 2: Twice the flange thickness is 21.4 mm');
    expect(read('IPE,IPE 300,,EN 10365,300,150,7.1,10.7,15', 'angle.csv')).toThrow('there is no column t_mm');
    expect(read('', 'timber.csv')).toThrow('timber.csv is not a file of the section catalogue.');
  });
});
