import { HttpStatus, Injectable, Logger } from '@nestjs/common';
import type { BeforeApplicationShutdown } from '@nestjs/common';
import { message, projectEventSchema } from '@mantlet/common';
import type { Role, StreamReadyDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import type { Response } from 'express';
import { DataSource } from 'typeorm';
import type { PostgresDataSourceOptions } from 'typeorm/driver/postgres/PostgresDataSourceOptions.js';
import { z } from 'zod';
import { isDesigner } from '../../shared/access.js';
import { ACCESS_CHANNEL, CHANGES_CHANNEL, audiences } from '../../shared/project-events.js';
import { Refusal } from '../../shared/refusal.js';
import { DatabaseListener } from './database-listener.js';
import { EventStream } from './event-stream.js';
import type { StreamHolder } from './event-stream.js';

/** a browser keeps six connections to a server: the pages must have one left to ask with */
export const STREAMS_PER_SESSION = 5;
/** each is a connection of the server's as well, and anybody may sign in again and again */
export const STREAMS_PER_PERSON = 30;
const BEAT_MS = 20_000;
const RECHECK_MS = 60_000;
/** changes this recent may have been committed after the page read and before its stream was open */
const RECENT = '60 seconds';

const announcementSchema = z.string()
  .transform((text, context): unknown => {
    try {
      return JSON.parse(text);
    } catch {
      context.addIssue({ code: 'custom', message: 'is not JSON' });
      return z.NEVER;
    }
  })
  .pipe(projectEventSchema.extend({ projectId: z.string(), audience: z.enum(audiences) }));

/** The open streams of this process: tells them what the database announces, and ends them with the right to hear it. */
@Injectable()
export class EventStreamsService implements BeforeApplicationShutdown {
  private readonly streams = new Set<EventStream>();
  private readonly listener: DatabaseListener;
  private timers: NodeJS.Timeout[] = [];
  private recheckSoon: NodeJS.Timeout | null = null;
  private closing = false;
  private readonly logger = new Logger('Events');

  constructor(@InjectDataSource() private readonly dataSource: DataSource) {
    const { url } = dataSource.options as PostgresDataSourceOptions;
    this.listener = new DatabaseListener(String(url), [CHANGES_CHANNEL, ACCESS_CHANNEL], {
      notified: (channel, payload) => (channel === CHANGES_CHANNEL ? this.tell(payload) : this.recheckShortly()),
      // they would show old numbers as current: each opens its stream again, and reads anew when it stands
      lost: () => this.endAll(),
    });
  }

  async open(holder: StreamHolder, response: Response): Promise<void> {
    if (this.closing || !(await this.listener.listening())) throw new Refusal(HttpStatus.SERVICE_UNAVAILABLE, message('live.unavailable', {}));
    if (response.destroyed) return;
    // counted without a pause before the stream is among them, so that many who ask at once are not all let in
    this.requirePlace(holder);
    const stream = new EventStream(holder, response);
    this.streams.add(stream);
    response.on('close', () => this.forget(stream));
    this.keepTime();
    stream.send('ready', { missed: await this.changedRecently(holder) } satisfies StreamReadyDto);
    // rights may have changed between the guard's look and the stream's entry in the list
    await this.recheck();
  }

  async beforeApplicationShutdown(): Promise<void> {
    this.closing = true;
    this.endAll();
    this.stopTime();
    if (this.recheckSoon) clearTimeout(this.recheckSoon);
    await this.listener.close();
  }

  private requirePlace({ sessionId, userId }: StreamHolder): void {
    const own = [...this.streams].filter((one) => one.holder.userId === userId);
    const windows = own.filter((one) => one.holder.sessionId === sessionId).length;
    if (windows >= STREAMS_PER_SESSION) throw new Refusal(HttpStatus.TOO_MANY_REQUESTS, message('live.too-many', { windows: STREAMS_PER_SESSION }));
    if (own.length >= STREAMS_PER_PERSON) throw new Refusal(HttpStatus.TOO_MANY_REQUESTS, message('live.too-many-in-all', { windows: STREAMS_PER_PERSON }));
  }

  /** What cannot be read is of no project that anybody could be told of; it must not stop the server either. */
  private tell(payload: string): void {
    const announced = announcementSchema.safeParse(payload);
    if (!announced.success) {
      this.logger.warn('An announcement of the database could not be read.');
      return;
    }
    const { projectId, audience, ...event } = announced.data;
    for (const stream of this.streams) {
      if (stream.holder.projectId === projectId && (audience === 'team' || isDesigner({ roles: [...stream.holder.roles] }))) stream.send('change', event);
    }
  }

  private async changedRecently({ projectId, roles }: StreamHolder): Promise<boolean> {
    const rows = await this.dataSource.manager.query<unknown[]>(
      `SELECT 1 FROM audit_entries WHERE project_id = $1 AND at > now() - interval '${RECENT}' AND ($2 OR entity = 'membership' OR action = 'revision issued') LIMIT 1`,
      [projectId, isDesigner({ roles: [...roles] })]);
    return rows.length > 0;
  }

  private recheckShortly(): void {
    this.recheckSoon ??= setTimeout(() => {
      this.recheckSoon = null;
      void this.recheck();
    }, 50);
  }

  /** Ends every stream whose session, account or roles are no longer what they were. */
  private async recheck(): Promise<void> {
    const asked = [...this.streams];
    if (asked.length === 0) return;
    try {
      const rows = await this.dataSource.manager.query<{ sid: string; projectId: string; roles: Role[] }[]>(
        `SELECT s.sid, m.project_id AS "projectId", m.roles FROM "session" s
           JOIN users u ON u.id::text = s.sess->'passport'->>'user' JOIN memberships m ON m.user_id = u.id
          WHERE s.sid = ANY($1) AND s.expire > now() AND NOT u.disabled`, [[...new Set(asked.map((one) => one.holder.sessionId))]]);
      const standing = new Map(rows.map((row) => [`${row.sid} ${row.projectId}`, row.roles.join()]));
      for (const stream of asked) {
        const { sessionId, projectId, roles } = stream.holder;
        if (standing.get(`${sessionId} ${projectId}`) !== roles.join()) this.end(stream);
      }
    } catch {
      // the database does not answer: nobody hears of a change now either; asked again in a minute
    }
  }

  private endAll(): void {
    for (const stream of this.streams) this.end(stream);
  }

  private end(stream: EventStream): void {
    stream.send('closed', {});
    stream.end();
    this.forget(stream);
  }

  private forget(stream: EventStream): void {
    this.streams.delete(stream);
    if (this.streams.size === 0) this.stopTime();
  }

  private keepTime(): void {
    if (this.timers.length > 0) return;
    this.timers = [
      setInterval(() => { for (const stream of this.streams) stream.beat(); }, BEAT_MS),
      setInterval(() => void this.recheck(), RECHECK_MS),
    ];
    for (const timer of this.timers) timer.unref();
  }

  private stopTime(): void {
    for (const timer of this.timers) clearInterval(timer);
    this.timers = [];
  }
}
