import { parentPort, workerData } from 'node:worker_threads';
import { renderSchedulePdf } from '../features/revisions/schedule-pdf/render.js';
import type { SchedulePdfInput } from '../features/revisions/schedule-pdf/types.js';

/** Entry of the worker thread: one schedule in, one PDF or the reason why there is none out. */
try {
  const pdf = await renderSchedulePdf(workerData as SchedulePdfInput);
  parentPort?.postMessage({ pdf });
} catch (error) {
  parentPort?.postMessage({ error: error instanceof Error ? (error.stack ?? error.message) : String(error) });
}
