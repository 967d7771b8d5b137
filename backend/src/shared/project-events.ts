import type { ProjectEventDto } from '@mantlet/common';
import type { EntityManager } from 'typeorm';

/** PostgreSQL's channels: changes of projects, and changes of who may see them (sent by triggers on sessions, accounts and teams). */
export const CHANGES_CHANNEL = 'mantlet_changes';
export const ACCESS_CHANNEL = 'mantlet_access';

/** Who may learn of a change: everybody on the team, or those who see work in progress. */
export const audiences = ['team', 'design-team'] as const;
export type Audience = (typeof audiences)[number];
export interface PublishedEvent extends ProjectEventDto {
  projectId: string;
  audience: Audience;
}

/** a notification holds 8000 bytes; labels are people's words of any length */
const LONGEST_TEXT = 400;

/** Told to every server process when the caller's transaction is committed, and not at all when it is not. */
export async function publish(manager: Pick<EntityManager, 'query'>, events: readonly PublishedEvent[]): Promise<void> {
  for (const event of events) {
    const text = event.text && event.text.length > LONGEST_TEXT ? `${event.text.slice(0, LONGEST_TEXT)}…` : event.text;
    await manager.query('SELECT pg_notify($1, $2)', [CHANGES_CHANNEL, JSON.stringify({ ...event, text })]);
  }
}

/** New results; who caused them is told with the change itself. */
export const resultsEvent = (projectId: string, topics: PublishedEvent['topics'] = ['results']): PublishedEvent =>
  ({ projectId, audience: 'design-team', topics, entityIds: [], by: null, at: new Date().toISOString(), text: null });
