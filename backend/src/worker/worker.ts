import { EventEmitter } from 'node:events';
import { Logger as NestLogger } from '@nestjs/common';
import type { INestApplicationContext } from '@nestjs/common';
import { jobKinds } from '@mantlet/common';
import type { JobKind } from '@mantlet/common';
import { Logger, run } from 'graphile-worker';
import type { JobHelpers, WorkerEvents } from 'graphile-worker';
import { DataSource } from 'typeorm';
import { RecalculationService } from '../features/assessment/recalculation.service.js';
import { ATTEMPTS, JobsService, addToQueue } from '../features/jobs/jobs.service.js';
import type { JobPayload } from '../features/jobs/jobs.service.js';
import { DEAD_WORKERS } from '../features/jobs/worker-locks.js';
import { WorkerPresence } from './presence.js';

const CARE_MS = 5000;

export interface RunningWorker {
  /** After the step in hand; what is left waits for the next worker. */
  stop: () => Promise<void>;
}

/** What each kind of job does; true when all of it is done. */
type Task = (projectId: string, stopping: () => boolean) => Promise<boolean>;
const tasksOf = (app: INestApplicationContext): Record<JobKind, Task> => {
  const recalculation = app.get(RecalculationService);
  return { recalculation: (projectId, stopping) => recalculation.run(projectId, stopping) };
};

/** Works off the queue in this process, with the features of the application. */
export async function startWorker(app: INestApplicationContext, url: string): Promise<RunningWorker> {
  const logger = new NestLogger('Worker');
  const dataSource = app.get(DataSource);
  const presence = new WorkerPresence(url);
  const events: WorkerEvents = new EventEmitter();
  let stopping = false;
  events.on('worker:create', ({ worker }) => {
    presence.add(worker.workerId).catch((error: unknown) => logger.error(`Worker ${worker.workerId} could not announce itself: ${String(error)}`));
  });
  await presence.open();
  const tasks = tasksOf(app);
  const runner = await run({
    connectionString: url, concurrency: 2, noHandleSignals: true, pollInterval: 1000, events, logger: quiet(logger),
    taskList: Object.fromEntries(jobKinds.map((kind) => [kind, (payload: unknown, helpers: JobHelpers) =>
      work(app.get(JobsService), dataSource, kind, tasks[kind], payload as JobPayload, helpers, () => stopping)])),
  });
  const care = setInterval(() => void takeUp(dataSource, logger), CARE_MS);
  care.unref();
  await takeUp(dataSource, logger);
  return {
    stop: async () => {
      stopping = true;
      clearInterval(care);
      await runner.stop();
      await presence.close();
    },
  };
}

async function work(jobs: JobsService, dataSource: DataSource, kind: JobKind, task: Task, { projectId }: JobPayload, { job }: JobHelpers, stopping: () => boolean): Promise<void> {
  try {
    if (!(await task(projectId, stopping))) await addToQueue(dataSource.manager, projectId, kind);
  } catch (error) {
    if (job.attempts < ATTEMPTS) throw error;
    new NestLogger('Worker').error(error instanceof Error ? error.stack : String(error));
    await jobs.fail(projectId, kind);
  }
}

/** What workers left behind that no longer live: their jobs are let go, and what fell out of the queue is put to it again. */
async function takeUp(dataSource: DataSource, logger: NestLogger): Promise<void> {
  try {
    const dead = await dataSource.query<{ name: string }[]>(DEAD_WORKERS);
    if (dead.length > 0) await dataSource.query('SELECT graphile_worker.force_unlock_workers($1)', [dead.map(({ name }) => name)]);
    const lost = await dataSource.query<{ projectId: string; kind: JobKind }[]>(
      `SELECT project_id AS "projectId", kind FROM jobs j WHERE state IN ('waiting', 'running') AND NOT EXISTS (
         SELECT 1 FROM graphile_worker.jobs g WHERE g.task_identifier = j.kind AND g.queue_name = 'project ' || j.project_id AND g.attempts < g.max_attempts)`);
    for (const { projectId, kind } of lost) await addToQueue(dataSource.manager, projectId, kind);
  } catch (error) {
    logger.warn(`Could not look after the queue: ${String(error)}`);
  }
}

/** graphile-worker tells of every job; only what went wrong is worth a line. */
const quiet = (logger: NestLogger): Logger =>
  new Logger(() => (level, text) => {
    if (level === 'error') logger.error(text);
    else if (level === 'warning') logger.warn(text);
  });
