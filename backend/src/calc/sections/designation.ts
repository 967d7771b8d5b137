/**
 * Section names as people write them, brought to one key: letters first, then the numbers joined by X.
 * `254 x 146 x 31 UB`, `UKB 254*146*31` and `457x191UB67` become UB254X146X31 and UB457X191X67; `HE 300 B` and `HEB300`
 * become HEB300. The family names are those of EN 10365, EN 10210, EN 10056 and ASTM A6/A500; older national spellings
 * (IPB of DIN 1025, UNP, RSA, UK prefixes) are *common practice* in steel schedules.
 */
const familySpellings: Record<string, string> = {
  UKB: 'UB', UKC: 'UC', UKBP: 'UBP', BP: 'UBP', UKPFC: 'PFC', UNP: 'UPN',
  IPB: 'HEB', IPBL: 'HEA', IPBV: 'HEM', IPBLL: 'HEAA',
  UKA: 'L', RSA: 'L', EA: 'L', UA: 'L', RSEA: 'L', RSUA: 'L', RSAL: 'L',
  HFSHS: 'SHS', HFRHS: 'RHS', HFCHS: 'CHS',
};

/** a mixed inch fraction (1-1/2), a fraction (5/16), or a decimal number */
const numberPattern = /\d+-\d+\/\d+|\d+\/\d+|\d+(?:\.\d+)?|\.\d+/g;
const anyNumber = new RegExp(numberPattern.source);

/** The key under which usual spellings of a section meet; '' where the text holds neither letters nor numbers. */
export function normaliseDesignation(text: string): string {
  const plain = text
    .normalize('NFKC')
    .toUpperCase()
    .replace(/[×✕*⨯]/g, 'X')
    // diameter signs and units say nothing that the numbers do not
    .replace(/[Ø⌀Φ]/g, ' ')
    .replace(/(\d)\s*(?:MM|KG\s*\/\s*M|KG)(?![A-Z])/g, '$1 ')
    // a decimal comma stands between digits; any other comma only separates
    .replace(/(\d),(\d)/g, '$1.$2');
  const numbers = (plain.match(numberPattern) ?? []).map(canonicalNumber);
  const letters = (plain.replace(numberPattern, ' ').match(/[A-Z]+/g) ?? []).map((run) => run.replace(/^X+|X+$/g, '')).join('');
  return assemble(familySpellings[letters] ?? letters, numbers);
}

function canonicalNumber(text: string): string {
  return text.includes('/') ? text : String(Number(text));
}

function assemble(letters: string, numbers: string[]): string {
  const family = letters === 'RHS' && numbers.length === 3 && numbers[0] === numbers[1] ? 'SHS' : letters;
  return family + withBothSides(family, numbers).join('X');
}

/** Square hollow sections and equal angles may be named by one side; sides come longer first, as in the standards. */
function withBothSides(family: string, numbers: string[]): string[] {
  const [first, second, third] = numbers;
  if ((family === 'SHS' || family === 'L') && numbers.length === 2) return [first!, first!, second!];
  if ((family === 'RHS' || family === 'L') && numbers.length === 3 && Number(second) > Number(first)) return [second!, first!, third!];
  return numbers;
}

const keysOf = new WeakMap<readonly string[], string[]>();

/**
 * The `count` candidates nearest to a name nobody knows, nearest first: of the same family before others, then by the
 * fewest edits, then by the nearest numbers. Candidates too far off to be a slip are left out. Pass the same array again
 * and its keys are not worked out twice.
 */
export function suggestDesignations(text: string, candidates: readonly string[], count: number): string[] {
  const wanted = normaliseDesignation(text);
  let keys = keysOf.get(candidates);
  if (!keys) {
    keys = candidates.map(normaliseDesignation);
    keysOf.set(candidates, keys);
  }
  const family = familyOf(wanted);
  const mostEdits = Math.max(2, Math.floor(wanted.length / 3));
  const near = keys.flatMap((key, i) => {
    const edits = editDistance(wanted, key, mostEdits);
    if (edits > mostEdits) return [];
    return [{ name: candidates[i]!, stranger: familyOf(key) === family ? 0 : 1, edits, apart: numbersApart(wanted, key) }];
  });
  near.sort((a, b) => a.stranger - b.stranger || a.edits - b.edits || a.apart - b.apart);
  return near.slice(0, count).map((n) => n.name);
}

function familyOf(key: string): string {
  const at = key.search(anyNumber);
  return at < 0 ? key : key.slice(0, at);
}

function numbersApart(a: string, b: string): number {
  const [left, right] = [a, b].map((key) => (key.match(numberPattern) ?? []).map(Number));
  const size = Math.max(left!.length, right!.length);
  let sum = 0;
  for (let i = 0; i < size; i += 1) sum += Math.abs((left![i] ?? 0) - (right![i] ?? 0)) || 0;
  return sum;
}

/** Levenshtein distance with neighbouring transpositions as one edit; stops early beyond `most`. */
function editDistance(a: string, b: string, most: number): number {
  if (Math.abs(a.length - b.length) > most) return most + 1;
  let before: number[] = [];
  let previous = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i += 1) {
    const current = [i];
    let least = i;
    for (let j = 1; j <= b.length; j += 1) {
      const same = a[i - 1] === b[j - 1] ? 0 : 1;
      let cost = Math.min(previous[j]! + 1, current[j - 1]! + 1, previous[j - 1]! + same);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) cost = Math.min(cost, before[j - 2]! + 1);
      current.push(cost);
      least = Math.min(least, cost);
    }
    if (least > most) return most + 1;
    [before, previous] = [previous, current];
  }
  return previous[b.length]!;
}
