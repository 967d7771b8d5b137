import { sentence } from '@mantlet/common';
import type { Reading } from './numbers.js';
import { readExposure, readGrade, readMemberType, readProtectionForm } from './words.js';

const said = <T>(reading: Reading<T>): T | string => (reading.ok ? reading.value : sentence(reading.reason));

describe('words of a schedule', () => {
  it.each([
    ['Beam', 'beam'], ['PRIMARY BEAM', 'beam'], ['Hauptträger', 'beam'], ['Haupttraeger', 'beam'], ['secondary-beam', 'secondary-beam'], ['Solive', 'secondary-beam'],
    ['col', 'column'], ['Stütze', 'column'], ['Poteau', 'column'], ['Brace', 'bracing'], ['Contreventement', 'bracing'], ['Tie or hanger', 'tie'], ['tirant', 'tie'],
  ])('%s is a %s', (text, expected) => {
    expect(said(readMemberType(text, 'Type'))).toBe(expected);
  });

  // designations of EN 10025-2, EN 10210-1 and ASTM A36, A500, A992
  it.each([
    ['S355', 'S355'], ['s 355 JR', 'S355'], ['S355J2+N', 'S355'], ['S275JRG2', 'S275'], ['S460M', 'S460'], ['S355J2H', 'S355'], ['EN 10025-2 S235JR', 'S235'],
    ['ASTM A992', 'A992'], ['A36', 'A36'], ['A500 Gr. C', 'A500C'], ['A500 Grade C', 'A500C'],
  ])('%s is the grade %s', (text, expected) => {
    expect(said(readGrade(text, 'Steel grade'))).toBe(expected);
  });

  it.each([
    ['4 sides', { arrangement: 'four-sides' }], ['3', { arrangement: 'three-sides' }], ['Three-sided', { arrangement: 'three-sides' }],
    ['Three sides, slab on top', { arrangement: 'three-sides' }], ['dreiseitig', { arrangement: 'three-sides' }], ['3 sides web filled', { arrangement: 'three-sides-web-filled' }],
    ['bottom, left', { arrangement: 'given-faces', faces: ['bottom', 'left'] }], ['Faces: left + bottom', { arrangement: 'given-faces', faces: ['bottom', 'left'] }],
  ])('%s is read as an exposure', (text, expected) => {
    expect(said(readExposure(text, 'Exposure'))).toEqual(expected);
  });

  it('says what it knows where a word is strange, and does not guess', () => {
    expect(said(readMemberType('widget', 'Type'))).toBe('"widget" is not known as type. Known: Beam, Secondary beam, Column, Bracing, Tie or hanger.');
    expect(said(readGrade('S350', 'Steel grade'))).toMatch(/^"S350" is not known as steel grade\. Known: S235, S275/);
    expect(said(readGrade('S3550', 'Steel grade'))).toMatch(/not known/);
    expect(said(readExposure('2 sides', 'Exposure'))).toMatch(/does not say which faces see fire/);
    expect(said(readExposure('bottom and inside', 'Exposure'))).toMatch(/not known as exposure/);
    expect(said(readProtectionForm('Boxed', 'Protection form'))).toBe('boxed');
    expect(said(readProtectionForm('wrapped', 'Protection form'))).toMatch(/Known: profile, boxed/);
  });
});
