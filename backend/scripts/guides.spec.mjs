import assert from 'node:assert/strict';
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import path from 'node:path';
import { test } from 'node:test';
import { at } from './lib/paths.mjs';

const folder = at('docs/guide');
const guides = readdirSync(folder).filter((name) => name.endsWith('.md'));
const linksOf = (name) => [...readFileSync(path.join(folder, name), 'utf8').matchAll(/\]\(([^)#]+)(?:#[^)]*)?\)/g)].map(([, link]) => link);

test('every role has its guide, and every link of a guide leads somewhere', () => {
  for (const role of ['fire-engineer', 'structural-engineer', 'specifier', 'contractor', 'inspector', 'reader', 'administrator']) assert.ok(guides.includes(`${role}.md`), role);
  assert.ok(guides.flatMap(linksOf).length > 20);
  for (const guide of guides) for (const link of linksOf(guide)) assert.ok(existsSync(path.join(folder, link)), `${guide}: ${link}`);
});

test('every picture is shown by a guide, is taken by the script, and is small', () => {
  const shown = new Set(guides.flatMap(linksOf).filter((link) => link.startsWith('pictures/')).map((link) => path.basename(link)));
  const kept = readdirSync(path.join(folder, 'pictures'));
  assert.ok(kept.length > 0);
  assert.deepEqual([...shown].sort(), [...kept].sort());
  const script = readFileSync(at('backend/scripts/pictures.mjs'), 'utf8');
  for (const name of kept) {
    assert.ok(script.includes(`name: '${path.basename(name, '.png')}'`), name);
    assert.ok(statSync(path.join(folder, 'pictures', name)).size <= 120_000, `${name} is too large`);
  }
});
