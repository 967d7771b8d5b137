import { LIVE_IDS, formatNumber } from '@mantlet/common';
import type { LiveTopic } from '@mantlet/common';
import type { Audience, PublishedEvent } from '../../shared/project-events.js';
import type { Recorded } from './audit.service.js';

const topics: Record<string, LiveTopic> = {
  project: 'project', level: 'levels', zone: 'zones', section: 'sections', member: 'members', product: 'products', import: 'imports',
  revision: 'revisions', membership: 'team',
};
/** What those without a design role see of a project as well: its name, its team, and what is issued. */
const titleFields = ['number', 'name', 'place'];
function audienceOf({ entity, action, changes = [] }: Recorded): Audience {
  if (entity === 'membership' || action === 'revision issued') return 'team';
  const titled = entity === 'project' && changes.length > 0 && changes.every((change) => titleFields.includes(change.field));
  return titled ? 'team' : 'design-team';
}

type Say = (what: string) => string;
/** What somebody did, by the action in the trail; `what` is the thing, or how many of them. */
const sayings: Record<string, Say> = {
  'design basis changed': () => 'changed the design basis',
  'takeoff settings changed': () => 'changed the takeoff settings',
  'protection set': (what) => `set the protection of ${what}`,
  'critical temperature set': (what) => `set the critical temperature of ${what}`,
  'shared product changed': (what) => `changed ${what} in the shared library`,
  'schedule imported': (what) => `imported ${what}`,
  'joined the team': (what) => `added ${what} to the team`,
  'left the team': (what) => `took ${what} off the team`,
  'roles changed': (what) => `changed the roles of ${what}`,
};
const verbs: Record<string, string> = {
  made: 'added', changed: 'changed', deleted: 'deleted', started: 'started', prepared: 'prepared', checked: 'checked', returned: 'returned', issued: 'issued',
};

function sentence({ actor, action, entity, label }: Recorded, count: number): string {
  const named = entity === 'membership' || entity === 'import' ? label : `${entity} ${label}`;
  const what = count === 1 ? named : `${formatNumber(count)} ${entity}s`;
  const said = sayings[action]?.(what);
  if (said) return `${actor.name} ${said}`;
  const [, accepted, no] = /^(.*?) (no longer )?accepted$/.exec(action) ?? [];
  if (accepted) return `${actor.name} ${no ? 'withdrew the acceptance of' : 'accepted'} ${accepted === 'leaving bare' ? accepted : `the ${accepted} of`} ${what}`;
  const verb = verbs[action.split(' ').at(-1) ?? ''];
  return verb ? `${actor.name} ${verb} ${what}` : `${actor.name}: ${action}, ${what}`;
}

/** One event for all entries of one action: five hundred members changed at once are one thing to tell. */
export function eventsOf(recorded: readonly Recorded[]): PublishedEvent[] {
  const groups = new Map<string, Recorded[]>();
  for (const entry of recorded) {
    if (entry.projectId === null || !(entry.entity in topics)) continue;
    const key = [entry.projectId, entry.actor.id, entry.entity, entry.action, audienceOf(entry)].join('|');
    const group = groups.get(key);
    if (group) group.push(entry);
    else groups.set(key, [entry]);
  }
  return [...groups.values()].map((entries) => eventOf(entries));
}

function eventOf(entries: readonly Recorded[]): PublishedEvent {
  const first = entries[0] as Recorded;
  const ids = entries.flatMap((entry) => entry.entityId ?? []);
  return {
    projectId: first.projectId as string, audience: audienceOf(first), topics: [topics[first.entity] as LiveTopic],
    entityIds: ids.length > LIVE_IDS ? [] : ids, by: first.actor.id === null ? null : { id: first.actor.id, name: first.actor.name },
    at: new Date().toISOString(), text: sentence(first, entries.length),
  };
}
