import { createHash } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../../shared/access.js';
import type { User } from './user.entity.js';

export function toActor(user: User): Actor {
  return { id: user.id, name: user.name, email: user.email, administrator: user.administrator };
}

/** Who proved to be somebody, and by which password. */
export interface Authenticated {
  actor: Actor;
  stamp: string;
}

/** Names the password that stands, without giving away its hash: a session is good for as long as the password that opened it. */
export const passwordStamp = (passwordHash: string): string => createHash('sha256').update(passwordHash).digest('hex').slice(0, 32);

/** All of a person's sessions, or all but the one given. */
export async function endSessionsOf(manager: EntityManager, userId: string, but = ''): Promise<number> {
  const [, ended] = (await manager.query(`DELETE FROM "session" WHERE sess->'passport'->>'user' = $1 AND sid <> $2`, [userId, but])) as [unknown, number];
  return ended;
}
