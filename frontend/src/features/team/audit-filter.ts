import type { AuditFilter } from './api/team.js';

/** What the trail tells of, by the names under which it is stored. */
export const auditThings: Record<string, string> = {
  project: 'Project and settings', membership: 'Team', level: 'Levels', zone: 'Zones', member: 'Members', section: 'Sections', product: 'Products', import: 'Imports', revision: 'Revisions',
};
const day = (value: string | null) => (value && /^\d{4}-\d{2}-\d{2}$/.test(value) && !Number.isNaN(Date.parse(value)) ? value : '');
const uuid = /^[\da-f]{8}(-[\da-f]{4}){3}-[\da-f]{12}$/i;

/** The filter stands in the address, so that a view of the trail can be kept and sent. What is not right there narrows nothing. */
export function auditFilterOf(params: URLSearchParams): AuditFilter {
  const what = params.get('what') ?? '';
  const who = params.get('who') ?? '';
  const page = Number(params.get('entries') ?? 1);
  return {
    search: (params.get('search') ?? '').slice(0, 200), who: uuid.test(who) ? who : '', what: Object.hasOwn(auditThings, what) ? what : '',
    from: day(params.get('from')), to: day(params.get('to')), page: Number.isInteger(page) && page > 0 && page < 1e6 ? page : 1,
  };
}
/** Back into the address; a change of the filter begins at its first page. */
export function auditParams(filter: AuditFilter): Record<string, string> {
  const { page, ...rest } = filter;
  return Object.fromEntries([...Object.entries(rest), ['entries', page > 1 ? String(page) : '']].filter(([, value]) => value !== '')) as Record<string, string>;
}
export const isNarrowed = ({ search, who, what, from, to }: AuditFilter): boolean => [search, who, what, from, to].some((v) => v !== '');
