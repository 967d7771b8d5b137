import { exposureNames, faceNames, memberTypeNames, message, steelGrades } from '@mantlet/common';
import type { Exposure, FaceName, MemberType, ProtectionForm, SteelGrade } from '@mantlet/common';
import { read, refuse } from './numbers.js';
import type { Reading } from './numbers.js';

/** Words of schedules brought to one spelling: no accents, no punctuation, small letters. */
export function plainWords(text: string): string {
  return text.normalize('NFKD').replace(/\p{Mn}/gu, '').toLowerCase().replace(/ß/g, 'ss').replace(/[^\p{L}\p{N}]+/gu, ' ').trim();
}

const typeWords: Record<MemberType, string[]> = {
  beam: ['beam', 'beams', 'main beam', 'primary beam', 'floor beam', 'roof beam', 'girder', 'transfer beam', 'rafter', 'trager', 'traeger', 'haupttrager', 'haupttraeger', 'unterzug', 'poutre'],
  'secondary-beam': ['secondary beam', 'secondary', 'joist', 'purlin', 'infill beam', 'nebentrager', 'nebentraeger', 'pfette', 'solive', 'poutre secondaire', 'panne'],
  column: ['column', 'columns', 'col', 'stanchion', 'post', 'stutze', 'stuetze', 'poteau', 'colonne'],
  bracing: ['bracing', 'brace', 'diagonal', 'vertical bracing', 'verband', 'diagonale', 'contreventement'],
  tie: ['tie', 'hanger', 'tie or hanger', 'tie rod', 'rod', 'zugstab', 'zugband', 'hanger rod', 'tirant', 'suspente'],
};

export function readMemberType(text: string, field: string): Reading<MemberType> {
  const words = plainWords(text);
  for (const [type, spellings] of Object.entries(typeWords) as [MemberType, string[]][]) {
    if (words === plainWords(type) || words === plainWords(memberTypeNames[type]) || spellings.includes(words)) return read(type);
  }
  return refuse(message('import.row-unknown-word', { field, text, known: Object.values(memberTypeNames) }));
}

/** Sub-grades (JR, J0, J2, K2, M, N, H …) do not change the yield strength; the plain grade is kept. */
export function readGrade(text: string, field: string): Reading<SteelGrade> {
  const plain = text.toUpperCase().replace(/^(EN\s*10025|EN\s*10210|ASTM)\S*\s+/, '').replace(/[\s.-]+/g, '').replace(/^ASTM/, '');
  const european = /^S(235|275|355|420|460)(?:[JKMNQ+][A-Z0-9+]*|H|W)?$/.exec(plain);
  const name = european ? `S${european[1]}` : plain.replace(/^A500(GR|GRADE)?C$/, 'A500C').replace(/^A992M?$/, 'A992');
  const grade = steelGrades.find((known) => known === name);
  return grade ? read(grade) : refuse(message('import.row-unknown-word', { field, text, known: [...steelGrades] }));
}

const exposureWords: Record<Exclude<Exposure['arrangement'], 'given-faces'>, string[]> = {
  'four-sides': ['4', '4 sides', '4 sided', '4 side', 'four sided', 'all round', 'all sides', 'allseitig', '4 seitig', 'vierseitig', '4 faces', '4 cotes'],
  'three-sides': ['3', '3 sides', '3 sided', '3 side', 'three sides', 'three sided', 'under slab', 'dreiseitig', '3 seitig', '3 faces', '3 cotes'],
  'three-sides-web-filled': ['3 sides web filled', '3 sided web filled', 'web filled', 'three sides web filled', 'kammer gefullt'],
  'slab-edge-one-side': ['1', '1 side', '1 sided', 'bottom only', 'soffit only', 'slim floor', 'in slab'],
  'slab-edge-two-sides': ['slab edge', 'slab edge beam', 'slab edge two sides'],
};

export function readExposure(text: string, field: string): Reading<Pick<Exposure, 'arrangement' | 'faces'>> {
  const words = plainWords(text);
  for (const [arrangement, spellings] of Object.entries(exposureWords) as [keyof typeof exposureWords, string[]][]) {
    if (words === plainWords(arrangement) || words === plainWords(exposureNames[arrangement]) || spellings.includes(words)) return read({ arrangement });
  }
  const parts = words.replace(/^faces? /, '').split(/ (?:and )?/);
  const faces = faceNames.filter((face) => parts.includes(face));
  if (faces.length && parts.every((part) => (faceNames as readonly string[]).includes(part))) return read({ arrangement: 'given-faces', faces: faces as FaceName[] });
  if (words === plainWords(exposureNames['given-faces']) || words === 'given faces' || /^(2|two) side/.test(words) || words === '2') {
    return refuse(message('import.row-faces', { text }));
  }
  return refuse(message('import.row-unknown-word', { field, text, known: [...Object.values(exposureNames).slice(0, 5), 'faces by name, such as "bottom, left"'] }));
}

const formWords: Record<ProtectionForm, string[]> = {
  profile: ['profile', 'profiled', 'following the profile', 'contour', 'coating', 'paint', 'spray', 'profilfolgend', 'contour du profil'],
  boxed: ['boxed', 'box', 'encased', 'board', 'boards', 'casing', 'kastenformig', 'kasten', 'caisson', 'en caisson'],
};

export function readProtectionForm(text: string, field: string): Reading<ProtectionForm> {
  const words = plainWords(text);
  const found = (Object.keys(formWords) as ProtectionForm[]).find((form) => formWords[form].includes(words));
  return found ? read(found) : refuse(message('import.row-unknown-word', { field, text, known: ['profile', 'boxed'] }));
}
