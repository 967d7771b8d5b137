/** Writes docs/formulas.md and docs/validation.md from the built calculation core: `npx tsc -b common backend`, then this. */
import { existsSync, writeFileSync } from 'node:fs';

const built = new URL('../dist/calc/validation/print-docs.js', import.meta.url);
if (!existsSync(built)) {
  console.error('The backend is not built yet. Run: npx tsc -b common backend');
  process.exit(1);
}
const { formulasMarkdown, validationMarkdown } = await import(built.href);
for (const [name, print] of [['formulas.md', formulasMarkdown], ['validation.md', validationMarkdown]]) {
  writeFileSync(new URL(`../../docs/${name}`, import.meta.url), print());
  console.log(`docs/${name} written`);
}
