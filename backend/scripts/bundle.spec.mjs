import assert from 'node:assert/strict';
import { test } from 'node:test';
import { bundleWeights, chunksFor, weigh } from './lib/bundle.mjs';

test('the Building page loads less than 200 kB of script of our own before its first paint', async () => {
  const { Building } = await bundleWeights();
  assert.ok(Building.modules > 20, 'the page’s modules were not found');
  assert.ok(Building.ours < 200_000, `ours are ${Building.ours} bytes in gzip`);
});

test('what is imported at once counts, what is fetched later does not, and a page that is not there is an error', () => {
  const chunk = (fileName, moduleIds, imports = []) => ({ fileName, moduleIds, imports, code: 'x', modules: Object.fromEntries(moduleIds.map((id) => [id, { code: 'y' }])) });
  const chunks = [
    chunk('main.js', ['/h/src/app/main.tsx', '/h/node_modules/react/index.js'], ['shared.js']), chunk('shared.js', ['/h/src/ui/page.tsx']),
    chunk('a.js', ['/h/a-page.tsx'], ['shared.js']), chunk('b.js', ['/h/b-page.tsx']),
  ];
  const loaded = chunksFor(chunks, 'a-page.tsx');
  assert.deepEqual(loaded.map((one) => one.fileName).sort(), ['a.js', 'main.js', 'shared.js']);
  assert.equal(weigh(loaded).modules, 3, 'a framework’s module is not ours');
  assert.throws(() => chunksFor(chunks, 'c-page.tsx'), /No chunk holds/);
});
