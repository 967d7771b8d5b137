/** npm run bundle: what each page loads before its first paint, the frameworks apart. */
import { bundleWeights } from './lib/bundle.mjs';
import { runCommand, say } from './lib/house.mjs';

const kb = (bytes) => `${(bytes / 1000).toFixed(1)} kB`;
await runCommand(async () => {
  say(`${'Page'.padEnd(14)}${'all, gzip'.padStart(12)}${'ours at most'.padStart(15)}${'files'.padStart(8)}`);
  for (const [name, { total, ours, files }] of Object.entries(await bundleWeights())) {
    say(`${name.padEnd(14)}${kb(total).padStart(12)}${kb(ours).padStart(15)}${String(files).padStart(8)}`);
  }
  return 0;
});
