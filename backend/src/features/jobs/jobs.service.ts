import { Injectable } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { JobDto, JobKind } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, Not } from 'typeorm';
import type { EntityManager } from 'typeorm';
import { publish, resultsEvent } from '../../shared/project-events.js';
import { conflict, notFound } from '../../shared/refusal.js';
import { Job } from './job.entity.js';
import { ANY_WORKER } from './worker-locks.js';

/** what the queue gives to the worker's task */
export interface JobPayload {
  projectId: string;
}
/** tried this often before people are told that it failed */
export const ATTEMPTS = 3;

/** Work in the background as people see it. One unfinished job a project and kind: what comes while it runs is taken up by it. */
@Injectable()
export class JobsService {
  constructor(@InjectDataSource() private readonly dataSource: DataSource) {}

  /** Unfinished and failed ones. */
  async list(projectId: string): Promise<JobDto[]> {
    const jobs = await this.dataSource.manager.find(Job, { where: { projectId, state: Not('done') }, order: { createdAt: 'ASC' } });
    if (jobs.length === 0) return [];
    const [workers] = await this.dataSource.query<{ alive: boolean }[]>(ANY_WORKER);
    return jobs.map((job) => toJobDto(job, workers?.alive ?? false));
  }

  unfinished(manager: EntityManager, projectId: string, kind: JobKind): Promise<Job | null> {
    return manager.findOneBy(Job, { projectId, kind, state: Not('done') });
  }

  /** In the caller's transaction, under the project's lock: the change and the job that follows from it stand or fall together. */
  async enqueue(manager: EntityManager, projectId: string, kind: JobKind, waiting: number): Promise<void> {
    await manager.query(
      `INSERT INTO jobs (project_id, kind, total) VALUES ($1, $2, $3)
       ON CONFLICT (project_id, kind) WHERE state <> 'done' DO UPDATE SET
         state = CASE jobs.state WHEN 'failed' THEN 'waiting' ELSE jobs.state END, reason = NULL, total = jobs.done + excluded.total`,
      [projectId, kind, waiting]);
    await addToQueue(manager, projectId, kind);
    await publish(manager, [resultsEvent(projectId, ['jobs'])]);
  }

  async retry(projectId: string, jobId: string): Promise<JobDto[]> {
    await this.dataSource.transaction(async (manager) => {
      const job = await manager.findOne(Job, { where: { id: jobId, projectId }, lock: { mode: 'pessimistic_write' } });
      if (!job) throw notFound('job');
      if (job.state !== 'failed') throw conflict(message('job.not-failed', {}));
      await manager.update(Job, jobId, { state: 'waiting', reason: null, startedAt: null, finishedAt: null, total: job.total - job.done, done: 0 });
      await addToQueue(manager, projectId, job.kind);
      await publish(manager, [resultsEvent(projectId, ['jobs'])]);
    });
    return this.list(projectId);
  }

  /** How far the one unfinished job of this kind is; `left` more are to be done. */
  async progress(manager: EntityManager, projectId: string, kind: JobKind, done: number, left: number): Promise<void> {
    await manager.query(
      `UPDATE jobs SET state = 'running', started_at = coalesce(started_at, now()), done = done + $3, total = done + $3 + $4
       WHERE project_id = $1 AND kind = $2 AND state <> 'done'`, [projectId, kind, done, left]);
    await publish(manager, [resultsEvent(projectId, ['jobs'])]);
  }

  async finish(manager: EntityManager, projectId: string, kind: JobKind): Promise<void> {
    await manager.query(
      `UPDATE jobs SET state = 'done', finished_at = now(), done = total WHERE project_id = $1 AND kind = $2 AND state <> 'done'`, [projectId, kind]);
    await publish(manager, [resultsEvent(projectId, ['jobs'])]);
  }

  async fail(projectId: string, kind: JobKind): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const job = await this.unfinished(manager, projectId, kind);
      if (!job) return;
      await manager.update(Job, job.id, { state: 'failed', finishedAt: new Date(), reason: message('job.failed', { done: job.done, total: job.total }) });
      await publish(manager, [resultsEvent(projectId, ['jobs'])]);
    });
  }
}

/** A job of the same key that has not begun is replaced; one that has begun is followed by this one, in the project's own queue. */
export async function addToQueue(manager: Pick<EntityManager, 'query'>, projectId: string, kind: JobKind): Promise<void> {
  await manager.query('SELECT graphile_worker.add_job($1, $2::json, queue_name => $3, max_attempts => $4, job_key => $5)',
    [kind, JSON.stringify({ projectId } satisfies JobPayload), `project ${projectId}`, ATTEMPTS, jobKey(projectId, kind)]);
}
export const jobKey = (projectId: string, kind: JobKind): string => `${kind} ${projectId}`;

function toJobDto({ id, kind, state, total, done, startedAt, reason }: Job, alive: boolean): JobDto {
  const seconds = startedAt ? (Date.now() - startedAt.getTime()) / 1000 : null;
  return {
    id, kind, state, total, done, withoutWorker: state !== 'failed' && !alive, error: reason && sentence(reason),
    secondsLeft: state === 'running' && seconds !== null && done > 0 ? Math.ceil((seconds / done) * (total - done)) : null,
  };
}
