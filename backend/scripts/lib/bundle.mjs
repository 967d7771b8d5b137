/** What a page's script weighs: built in memory, the frameworks apart from everything else. */
import { createRequire } from 'node:module';
import { pathToFileURL } from 'node:url';
import { gzipSync } from 'node:zlib';
import { at } from './paths.mjs';

/** The frameworks that every page stands on. All else counts as the product's own, other libraries included. */
const framework = /[\\/]node_modules[\\/](?:react|react-dom|scheduler|react-router|react-router-dom|antd|@ant-design|@rc-component|@emotion|@tanstack|react-hook-form|@hookform|zod)[\\/]/;
const entry = 'src/app/main.tsx';

/** @returns {Promise<any[]>} the chunks of the built client */
async function build() {
  const { build: viteBuild } = await import(pathToFileURL(createRequire(at('frontend/package.json')).resolve('vite')).href);
  const result = await viteBuild({ root: at('frontend'), configFile: at('frontend/vite.config.ts'), logLevel: 'error', build: { write: false } });
  return [result].flat().flatMap((one) => one.output).filter((one) => one.type === 'chunk');
}

/** The chunks loaded for a page at its first paint: the entry's, the page's and all that these import at once. */
export function chunksFor(chunks, page) {
  const byFile = new Map(chunks.map((chunk) => [chunk.fileName, chunk]));
  const holding = (module) => chunks.find((chunk) => chunk.moduleIds.some((id) => id.split('?')[0].endsWith(module)));
  const wanted = new Set();
  const queue = [entry, page].map((module) => {
    const chunk = holding(module);
    if (!chunk) throw new Error(`No chunk holds ${module}.`);
    return chunk.fileName;
  });
  for (let file = queue.pop(); file !== undefined; file = queue.pop()) {
    if (wanted.has(file)) continue;
    wanted.add(file);
    queue.push(...(byFile.get(file)?.imports ?? []));
  }
  return [...wanted].map((file) => byFile.get(file)).filter(Boolean);
}

/**
 * In gzip: all of it as sent, and at most how much of that is ours. Ours are the modules' texts before they are made smaller,
 * so that the figure can only be too high.
 */
export function weigh(chunks) {
  const ours = chunks.flatMap((chunk) => Object.entries(chunk.modules)).filter(([id]) => !framework.test(id));
  return {
    files: chunks.length,
    total: chunks.reduce((sum, chunk) => sum + gzipSync(chunk.code).length, 0),
    ours: gzipSync(ours.map(([, module]) => module.code ?? '').join('\n')).length,
    modules: ours.length,
  };
}

export const pages = {
  Building: 'features/building/pages/building-page.tsx',
  Members: 'features/members/pages/members-page.tsx',
  'A member': 'features/members/pages/member-page.tsx',
  Quantities: 'features/quantities/pages/quantities-page.tsx',
  Projects: 'features/projects/pages/projects-page.tsx',
};
/** @returns {Promise<Record<string, { files: number, total: number, ours: number, modules: number }>>} */
export async function bundleWeights() {
  const chunks = await build();
  return Object.fromEntries(Object.entries(pages).map(([name, page]) => [name, weigh(chunksFor(chunks, page))]));
}
