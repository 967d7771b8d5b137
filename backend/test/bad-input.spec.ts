import { accessTable } from './access.table.js';
import { EveryRoute, faultOf, writing } from './support/every-route.js';
import type { Answer } from './support/every-route.js';
import { BEYOND, MISSING, fieldsOf, holds, hostileFor, isPlain, short, withValue } from './support/hostile.js';
import type { JsonSchema, Path } from './support/hostile.js';

/** One of their kind is walked to its last field; the others share the contract, so that their upper fields are enough. */
const walkedElsewhere: [RegExp, (path: Path) => boolean][] = [
  [/POST .*products$|\/api\/products\/:productId$/, (path) => path.length > 1],
  [/members\/(bulk|bulk\/preview|structural|delete)$|acceptances$/, (path) => path.includes('filter') || (path.includes('basis') && path.length > 1)],
  [/members\/bulk\/preview$/, (path) => path.length > 1],
];
/** never shown again, or not under this name */
const unseen = new Set(['password', 'current', 'next', 'token', 'email', 'version', 'query', 'kind', 'reason', 'stamp', 'leaveOutWrongRows', 'headerRow', 'sheet', 'roles', 'disabled']);

let routes: EveryRoute;
let readAgain = 0;
let turn = 0;
beforeAll(async () => {
  routes = await EveryRoute.start();
});
afterAll(() => routes.app.stop());

/** Where what a route writes can be read: the thing itself, or the list that it stands in. */
function readingOf(key: string, answer: Answer): string | null {
  const [verb, path] = key.split(' ') as [string, string];
  const known = (one: string): boolean => `GET ${one}` in accessTable;
  const at = (one: string): string => routes.pathOf(`GET ${one}`);
  if (/members\/(bulk|structural)$/.test(path)) return at(path.replace(/\/\w+$/, '/:memberId'));
  if (verb === 'POST') {
    const id = (answer.body as { id?: string }).id;
    const one = Object.keys(accessTable).some((read) => read.startsWith(`GET ${path}/:`) && read.split('/').length === path.split('/').length + 1);
    if (one && id) return `${at(path)}/${id}`;
    // the list of sections is paged
    return known(path) && !path.endsWith('sections') ? at(path) : null;
  }
  const parts = path.split('/');
  const found = parts.map((_, i) => parts.slice(0, parts.length - i).join('/')).find(known);
  return found ? at(found) : null;
}

/** What was let through stands where it can be read again, as it was sent: blanks around it apart. */
async function faultOfKeeping(key: string, answer: Answer, path: Path, value: unknown): Promise<string | null> {
  const name = [...path].reverse().find((part): part is string => typeof part === 'string') ?? '';
  // no product is none at all
  if (name === 'productId' && value === null) return null;
  if (value === MISSING || value === BEYOND || !isPlain(value) || unseen.has(name) || typeof path.at(-1) === 'number' || path.includes('filter')) return null;
  const reading = readingOf(key, answer);
  const read = reading ? await routes.send('GET', reading) : answer;
  readAgain += 1;
  if (read.misfit) return 'is let through, and what is read afterwards does not fit what the route states';
  const allowed = typeof value === 'string' ? [value, value.trim()] : [value];
  return allowed.some((one) => holds(read.body, name, one)) ? null : 'is let through, and reads otherwise afterwards';
}

async function faultsIn(key: string, schema: JsonSchema): Promise<string[]> {
  const faults: string[] = [];
  const elsewhere = (path: Path): boolean => walkedElsewhere.some(([alike, there]) => alike.test(key) && there(path));
  for (const { path, schema: place, body } of fieldsOf(schema, routes.bodies[key]!(routes.things), routes.components)) {
    if (elsewhere(path)) continue;
    const standing = path.reduce<unknown>((value, part) => (value as Record<string | number, unknown> | null | undefined)?.[part], body);
    // deep inside, one in three, a different third from field to field, so that every kind is tried in every contract
    const tried = hostileFor(place, routes.components, standing).filter((_, i) => path.length <= 2 || i % 3 === turn % 3);
    turn += 1;
    for (const [said, value] of tried) {
      const answer = await routes.sendJson(key, withValue(routes.fresh(key, body as object), path, value));
      const done = answer.status < 300;
      const fault = faultOf(answer, value) ?? (done ? await faultOfKeeping(key, answer, path, value) : null);
      if (fault) faults.push(`${path.join('.')} with ${said} (${short(value)}): ${fault}`);
      if (done) await routes.again(key);
    }
  }
  return faults;
}

const withBody = writing.filter((key) => !/^DELETE .*(?<!acceptances)$|\/(retry|prepare|check|issue|recalculate|invitation)$/.test(key));

describe('what does not fit', () => {
  it('is tried on bodies that would fit, of every route that takes one', async () => {
    const takers = writing.filter((one) => routes.operations[one]!.requestBody);
    expect([...withBody].sort()).toEqual([...takers].sort());
    const faults: string[] = [];
    for (const key of takers) {
      const answer = await routes.sendJson(key, routes.fresh(key));
      if (answer.status === 400) faults.push(`${key}: ${JSON.stringify(answer.body)}`);
    }
    expect(faults).toEqual([]);
    await routes.begin();
  });

  it.each(withBody)('in the body of %s is refused in a sentence, or kept as it is', async (key) => {
    expect(await faultsIn(key, routes.operations[key]!.requestBody!.content['application/json']!.schema)).toEqual([]);
  }, 600_000);

  it('left much that could be read again', () => {
    expect(routes.letThrough).toBeGreaterThan(300);
    expect(readAgain).toBeGreaterThan(200);
  });
});
