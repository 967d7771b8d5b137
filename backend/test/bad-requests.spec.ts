import { gzipSync } from 'node:zlib';
import { accessTable } from './access.table.js';
import { EveryRoute, faultOf, writing } from './support/every-route.js';
import type { Sent } from './support/every-route.js';
import { hostileInAddress } from './support/hostile.js';

let routes: EveryRoute;
beforeAll(async () => {
  routes = await EveryRoute.start();
});
afterAll(() => routes.app.stop());
const keys = Object.keys(accessTable);

describe('what is no body of ours', () => {
  const valid = (key: string): string => (key in routes.bodies ? JSON.stringify(routes.fresh(key)) : '{}');
  const odd: [string, (key: string) => Sent][] = [
    ['JSON that is cut off', () => ({ body: '{"name":', type: 'application/json' })],
    ['null', () => ({ body: 'null', type: 'application/json' })],
    ['a list', () => ({ body: '[]', type: 'application/json' })],
    ['a nest of a hundred thousand', () => ({ body: '['.repeat(100_000), type: 'application/json' })],
    ['no JSON though it says so', () => ({ body: '<xml/>', type: 'application/json' })],
    ['XML', (key) => ({ body: valid(key), type: 'application/xml' })],
    ['plain text', (key) => ({ body: valid(key), type: 'text/plain' })],
    ['fields of a page’s form', () => ({ body: 'name[a][b]=1&code=%00&__proto__[polluted]=1', type: 'application/x-www-form-urlencoded' })],
    ['an unknown character set', (key) => ({ body: valid(key), type: 'application/json; charset=nonsense' })],
    ['compressed nonsense', () => ({ body: 'not gzip', type: 'application/json', encoding: 'gzip' })],
    ['an unknown compression', (key) => ({ body: valid(key), type: 'application/json', encoding: 'nonsense' })],
    ['little that unfolds to much', () => ({ body: bomb as BodyInit, type: 'application/json', encoding: 'gzip' })],
    ['more than is taken', () => ({ body: `{"name":"${'x'.repeat(5_000_000)}"}`, type: 'application/json' })],
  ];
  const bomb = gzipSync(' '.repeat(50_000_000));

  it.each(odd)('%s is refused in a sentence by every route that writes', async (_, sent) => {
    const faults: string[] = [];
    // signing out needs no body, and ends the walk
    for (const key of writing.filter((one) => routes.operations[one]!.requestBody)) {
      const answer = await routes.send(key, routes.pathOf(key), sent(key));
      const fault = answer.status < 400 ? `${answer.status}, let through` : faultOf(answer);
      if (fault && !(answer.status < 400 && /leaveOut|confirm/.test(key))) faults.push(`${key}: ${fault}`);
    }
    expect(faults).toEqual([]);
  });

  it('keys that all objects share are keys like any other', async () => {
    const faults: string[] = [];
    for (const key of writing.filter((one) => routes.operations[one]!.requestBody && !/delete$|confirm$/.test(one))) {
      const body = JSON.stringify(routes.fresh(key)).replace('{', '{"__proto__":{"polluted":true},"constructor":{"prototype":{"polluted":true}},');
      const fault = faultOf(await routes.send(key, routes.pathOf(key), { body, type: 'application/json' }));
      if (fault) faults.push(`${key}: ${fault}`);
    }
    expect(faults).toEqual([]);
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });
});

describe('what does not fit in the address', () => {
  it.each(keys.filter((key) => key.includes(':')))('in the path of %s is refused in a sentence', async (key) => {
    const faults: string[] = [];
    for (const [name] of key.matchAll(/:\w+/g)) {
      for (const hostile of ['x', '%00', '%E0%A4%A', '%ED%A0%80', '..%2f..', '__proto__', '%F0%9F%94%A5', 'null', `${routes.things.zoneId}%20`, '0'.repeat(3000)]) {
        const path = routes.pathOf(key.replace(name, 'HERE')).replace('HERE', hostile);
        const answer = await routes.send(key, path, key.startsWith('GET') ? {} : { body: JSON.stringify(key in routes.bodies ? routes.fresh(key) : {}), type: 'application/json' });
        const fault = answer.status < 400 ? `${answer.status}, let through` : faultOf(answer);
        if (fault) faults.push(`${name} as ${hostile.slice(0, 20)}: ${fault}`);
      }
    }
    expect(faults).toEqual([]);
  });

  it.each(keys.filter((key) => key.startsWith('GET')))('in the query of %s is refused in a sentence, or of no effect', async (key) => {
    const faults: string[] = [];
    const names = routes.operations[key]!.parameters.filter((one) => one.in === 'query').map((one) => one.name);
    for (const query of [...names.flatMap(hostileInAddress), '__proto__[a]=1', 'a[b]=1', '%', '&&=&', 'toString=1']) {
      const fault = faultOf(await routes.send(key, `${routes.pathOf(key)}?${query}`));
      if (fault) faults.push(`${query.slice(0, 60)}: ${fault}`);
    }
    expect(faults).toEqual([]);
  });
});
