import type { LiveTopic } from '@mantlet/common';

/**
 * Which queries of a project a change makes old, by the first word of their key below the project. Results hang together, so most
 * changes come with the topic "results" as well, which reaches everything that shows one.
 */
const names = ['self', 'audit'];
const queriesOf: Record<LiveTopic, readonly string[]> = {
  project: [...names, 'quantities', 'readiness', 'site'],
  levels: [...names, 'levels', 'zones', 'building', 'members', 'member', 'quantities'],
  zones: [...names, 'zones', 'building', 'members', 'member', 'quantities', 'products'],
  sections: ['audit', 'sections'],
  members: [...names, 'members', 'member', 'zones', 'building', 'quantities', 'readiness', 'import'],
  products: [...names, 'products', 'zones', 'member'],
  imports: ['audit', 'import'],
  revisions: [...names, 'revisions', 'readiness', 'building', 'site'],
  team: [...names, 'memberships'],
  results: ['self', 'building', 'zones', 'members', 'member', 'quantities', 'readiness', 'products'],
  jobs: ['jobs'],
};

export const queriesTouched = (topics: readonly LiveTopic[]): string[] => [...new Set(topics.flatMap((topic) => queriesOf[topic]))];

/** What the list of all projects shows. */
export const touchesProjectList = (topics: readonly LiveTopic[]): boolean =>
  topics.some((topic) => (['project', 'members', 'revisions', 'team', 'results'] as LiveTopic[]).includes(topic));
