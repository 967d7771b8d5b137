import { availableParallelism } from 'node:os';
import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { Client } from 'pg';
import { assessMembers } from '../calc/index.js';
import { generatedMembers } from './generated-members.js';
import { assessPlainly } from './plain-loop.js';
import { copyText, countStored, createTable, dropTable, timeStoring } from './store-results.js';

const count = 20_000;
const rounds = 3;

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[values.length >> 1] as number;
}

setFlagsFromString('--expose-gc');
const collectGarbage = runInNewContext('gc') as () => void;

/** What preparing the members left behind is cleared away before the clock starts. */
function timed<T>(work: () => T): { ms: number; value: T } {
  collectGarbage();
  const start = performance.now();
  const value = work();
  return { ms: performance.now() - start, value };
}

function line(name: string, times: readonly number[], yardstick: number): string {
  const middle = median(times);
  const rates = `${Math.round(count / (middle / 1000)).toLocaleString('en')} a second`;
  const all = times.map((t) => t.toFixed(0)).join(', ');
  return `${name.padEnd(34)} ${middle.toFixed(0).padStart(7)} ms  ${rates.padStart(18)}  ${(middle / yardstick).toFixed(2).padStart(7)} × storing   (${all})`;
}

/** Prints, side by side in one run, how long assessing takes against the plain loop and against storing the results. */
async function run(connectionString: string): Promise<void> {
  const client = new Client({ connectionString });
  await client.connect();
  try {
    await createTable(client);
    const assess: number[] = [];
    const plain: number[] = [];
    const store: number[] = [];
    for (let round = 0; round < rounds; round += 1) {
      // other members in every round: no answer of the last one helps; the fields that its first members filled are kept, as in a running server
      const cases = generatedMembers(count, 20_261 + round);
      const assessed = timed(() => assessMembers(cases));
      assess.push(assessed.ms);
      store.push(await timeStoring(client, copyText(assessed.value)));
      const stored = await countStored(client);
      if (stored !== count) throw new Error(`${stored} of ${count} results were stored`);
      const alone = timed(() => assessPlainly(cases));
      plain.push(alone.ms);
      const unlike = alone.value.filter((r, i) => r.verdict !== assessed.value[i]?.verdict || r.requiredThickness !== assessed.value[i]?.requiredThickness).length;
      if (unlike > 0) throw new Error(`${unlike} members come out otherwise in the plain loop`);
    }
    const { rows } = await client.query<{ server_version: string }>('SHOW server_version');
    const yardstick = median(store);
    console.log(`${count.toLocaleString('en')} distinct members, medians of ${rounds} rounds; Node ${process.version}, PostgreSQL ${rows[0]?.server_version}, ${availableParallelism()} processors`);
    console.log(line('Assessing, one thread', assess, yardstick));
    console.log(line('Plain loop, each member alone', plain, yardstick));
    console.log(line('Storing the results by COPY', store, yardstick));
    console.log(`Assessing takes ${(median(assess) / yardstick).toFixed(2)} of the time of storing and ${(median(plain) / median(assess)).toFixed(1)} times less than the plain loop.`);
    await dropTable(client);
  } finally {
    await client.end();
  }
}

const url = process.env['MANTLET_DATABASE_URL'];
if (!url) {
  console.error('MANTLET_DATABASE_URL is not set. Run this through "npm run bench", which starts a database server of its own.');
  process.exitCode = 1;
} else {
  await run(url);
}
