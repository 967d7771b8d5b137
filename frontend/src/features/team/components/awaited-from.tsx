import { joinWords } from '../../../lib/format.js';
import { useMemberships } from '../api/team.js';

/** Who issues the schedule, by name, for those who wait for it. Says nothing until it knows. */
export function AwaitedFrom({ projectId }: { projectId: string }) {
  const people = useMemberships(projectId).data;
  if (!people) return null;
  const names = people.filter((p) => p.roles.includes('specifier')).map((p) => p.name);
  if (names.length === 0) return <>The team has no specifier yet; ask the fire engineer.</>;
  return <>It is awaited from {joinWords(names)}.</>;
}
