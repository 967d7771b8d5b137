import type { ImportField, ImportMapping } from '@mantlet/common';
import { plainWords } from './words.js';

/**
 * What schedules call their columns, in English and the commonest German and French words (*common practice*);
 * the first of a list is the surest.
 */
const aliases: Record<ImportField, string[]> = {
  mark: ['mark', 'member mark', 'piece mark', 'assembly mark', 'mark no', 'member', 'member no', 'member id', 'piece', 'assembly', 'tag', 'position', 'pos', 'pos nr', 'positionsnummer', 'bauteil', 'bauteil nr', 'kennung', 'repere', 'marque', 'name', 'id'],
  level: ['level', 'floor', 'storey', 'story', 'floor level', 'geschoss', 'ebene', 'etage', 'niveau'],
  zone: ['zone', 'fire zone', 'fire compartment', 'compartment', 'area', 'brandabschnitt', 'bereich', 'compartiment'],
  memberType: ['type', 'member type', 'element type', 'element', 'category', 'bauteilart', 'typ', 'art', 'type d element', 'nature'],
  section: ['section', 'section size', 'member size', 'serial size', 'size', 'profile', 'designation', 'section designation', 'profil', 'querschnitt', 'profilbezeichnung', 'profile type'],
  grade: ['grade', 'steel grade', 'material grade', 'material', 'steel', 'stahlsorte', 'stahlgute', 'guete', 'gute', 'werkstoff', 'nuance', 'nuance d acier', 'acier'],
  length: ['length', 'member length', 'cut length', 'len', 'l', 'lange', 'laenge', 'longueur'],
  quantity: ['number off', 'no off', 'quantity', 'qty', 'off', 'number', 'count', 'no', 'pcs', 'pieces', 'anzahl', 'stuck', 'stueck', 'stk', 'menge', 'quantite', 'nombre', 'qte', 'nb'],
  exposure: ['exposure', 'exposed sides', 'heated sides', 'sides exposed', 'sides', 'fire exposure', 'beflammung', 'beflammte seiten', 'exposition', 'faces exposees'],
  protectionForm: ['protection form', 'form of protection', 'form', 'protection type', 'bekleidungsart', 'bekleidung', 'forme de protection', 'forme'],
  note: ['note', 'notes', 'remark', 'remarks', 'comment', 'comments', 'bemerkung', 'bemerkungen', 'hinweis', 'remarque', 'commentaire', 'observations'],
  criticalTemperature: ['critical temperature', 'critical temp', 'crit temp', 'limiting temperature', 'limiting temp', 'theta cr', 'θcr', 'θ cr', 'theta a cr', 'tcr', 't cr', 'kritische temperatur', 'temperature critique'],
  utilisation: ['utilisation in fire', 'utilization in fire', 'fire utilisation', 'fire utilization', 'degree of utilisation', 'utilisation', 'utilization', 'mu0', 'μ0', 'mu 0', 'ausnutzungsgrad', 'ausnutzung', 'taux d utilisation'],
  reference: ['reference', 'calculation reference', 'calc ref', 'ref', 'source', 'nachweis', 'quelle'],
};
const fieldByAlias = new Map<string, { field: ImportField; rank: number }>();
for (const [field, names] of Object.entries(aliases) as [ImportField, string[]][]) names.forEach((name, rank) => fieldByAlias.set(name, { field, rank }));

type LengthUnit = ImportMapping['lengthUnit'];
const unitWords: Record<string, LengthUnit | 'C' | 'F'> = {
  mm: 'mm', cm: 'cm', m: 'm', metres: 'm', meters: 'm', in: 'in', inch: 'in', inches: 'in', ft: 'ft', feet: 'ft', 'ft in': 'ft-in', 'feet inches': 'ft-in',
  c: 'C', 'deg c': 'C', celsius: 'C', f: 'F', 'deg f': 'F', fahrenheit: 'F',
};

export interface HeaderReading {
  field: ImportField;
  /** place in the field's list: the lower, the surer */
  rank: number;
  unit: LengthUnit | 'C' | 'F' | null;
}

/** What a header says its column holds: "Length (mm)", "L [m]", "Länge in mm", "θcr °C"; null where it is not known. */
export function readHeader(text: string): HeaderReading | null {
  const bracketed = /^(.*?)\s*[[(]([^\])]*)[\])]\s*$/.exec(text);
  const unit = bracketed ? unitOf(bracketed[2]!) : null;
  const name = plainWords(bracketed ? bracketed[1]! : text);
  const known = fieldByAlias.get(name);
  if (known) return { ...known, unit };
  const trailing = /^(.*?)[\s,/]+(?:in\s+)?([°\p{L}]+)$/iu.exec(bracketed ? bracketed[1]! : text);
  const trailingUnit = trailing ? unitOf(trailing[2]!) : null;
  const named = trailing && trailingUnit ? fieldByAlias.get(plainWords(trailing[1]!)) : undefined;
  return named ? { ...named, unit: trailingUnit } : null;
}

function unitOf(text: string): HeaderReading['unit'] {
  return unitWords[plainWords(text)] ?? null;
}

/** 0-based index of the row that names the most fields, among the first 40; titles above it are passed over. Null where none names two. */
export function findHeaderRow(rows: readonly string[][]): number | null {
  let best: { index: number; fields: number } | null = null;
  for (let index = 0; index < Math.min(rows.length, 40); index += 1) {
    const fields = new Set(rows[index]!.flatMap((cell) => readHeader(cell)?.field ?? [])).size;
    if (fields >= 2 && fields > (best?.fields ?? 0)) best = { index, fields };
  }
  return best?.index ?? null;
}
