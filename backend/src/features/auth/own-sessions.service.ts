import { Injectable } from '@nestjs/common';
import type { OwnSessionDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { Actor } from '../../shared/access.js';
import { notFound } from '../../shared/refusal.js';
import { AuditService } from '../audit/audit.service.js';
import { deviceInWords } from './device-words.js';
import { SESSION_HOURS } from './session.js';

/** a name for it that does not give away the identifier in the cookie */
const NAMED = `encode(sha256(convert_to(sid, 'UTF8')), 'hex')`;
interface SessionRow {
  name: string;
  sid: string;
  opened: { at: string; userAgent: string } | null;
  last_seen_at: Date;
}

/** A person's own sessions, and no other's. */
@Injectable()
export class OwnSessionsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly audit: AuditService,
  ) {}

  /** The one that asks first, then the latest seen. A session's end moves with each request, which tells when the last one was. */
  async list(actor: Actor, ownSid: string): Promise<OwnSessionDto[]> {
    const rows = await this.dataSource.query<SessionRow[]>(
      `SELECT ${NAMED} AS name, sid, sess->'opened' AS opened, expire::timestamptz - $2 * interval '1 hour' AS last_seen_at
       FROM "session" WHERE sess->'passport'->>'user' = $1 AND expire > now()::timestamp ORDER BY sid = $3 DESC, expire DESC`,
      [actor.id, SESSION_HOURS, ownSid],
    );
    return rows.map((row) => ({
      id: row.name, device: deviceInWords(row.opened?.userAgent ?? ''), startedAt: row.opened?.at ?? null,
      lastSeenAt: row.last_seen_at.toISOString(), current: row.sid === ownSid,
    }));
  }

  async end(actor: Actor, name: string): Promise<void> {
    const ended = await this.delete(actor, 'session ended', `${NAMED} = $2`, name);
    if (!ended) throw notFound('session');
  }

  async endOthers(actor: Actor, ownSid: string): Promise<void> {
    await this.delete(actor, 'other sessions ended', 'sid <> $2', ownSid);
  }

  private async delete(actor: Actor, action: string, which: string, value: string): Promise<number> {
    return this.dataSource.transaction(async (manager) => {
      const [, ended] = (await manager.query(`DELETE FROM "session" WHERE sess->'passport'->>'user' = $1 AND ${which}`, [actor.id, value])) as [unknown, number];
      if (ended) await this.audit.record(manager, { projectId: null, actor, action, entity: 'user', entityId: actor.id, label: actor.email });
      return ended;
    });
  }
}
