import { memberNarrowingSchema, memberQuerySchema } from '@mantlet/common';
import type { MemberNarrowing, MemberQuery } from '@mantlet/common';

/** What the list shows, as it stands in the address: without defaults. Which window of it is on screen is no part of it. */
export type MemberFilter = Partial<Omit<MemberQuery, 'page' | 'pageSize'>>;

const { page: _page, pageSize: _pageSize, ...fields } = memberQuerySchema.shape;
type Key = keyof typeof fields;
const keys = Object.keys(fields) as Key[];
const plain: Partial<Record<Key, unknown>> = { sort: 'mark', direction: 'asc' };
/** The parts that narrow the list, not those that order it. */
export const narrowingKeys = Object.keys(memberNarrowingSchema.shape) as (keyof MemberNarrowing)[];

const isEmpty = (value: unknown) => value === undefined || value === null || value === '' || (Array.isArray(value) && value.length === 0);

/** Reads the address key by key, so that one wrong value costs that value and not the whole filter. */
export function filterOfAddress(params: URLSearchParams): MemberFilter {
  const filter: Record<string, unknown> = {};
  for (const key of keys) {
    const text = params.get(key);
    if (text === null || text === '') continue;
    const parsed = fields[key].safeParse(text);
    if (parsed.success && !isEmpty(parsed.data)) filter[key] = parsed.data;
  }
  return filter as MemberFilter;
}

/** Writes the filter into an address; defaults and what is empty are left out. Other parameters stay. */
export function addressOfFilter(filter: MemberFilter, others: URLSearchParams = new URLSearchParams()): URLSearchParams {
  const params = new URLSearchParams(others);
  for (const key of keys) {
    const value = filter[key];
    if (isEmpty(value) || value === plain[key]) params.delete(key);
    else params.set(key, Array.isArray(value) ? value.join(',') : String(value));
  }
  return params;
}

export const isNarrowed = (filter: MemberFilter): boolean => narrowingKeys.some((key) => !isEmpty(filter[key]));
export const cleared = ({ sort, direction }: MemberFilter): MemberFilter => ({ ...(sort && { sort }), ...(direction && { direction }) });
/** The filter alone, as the server is asked to find everything by it. */
export const narrowing = (filter: MemberFilter): MemberNarrowing =>
  Object.fromEntries(narrowingKeys.filter((key) => !isEmpty(filter[key])).map((key) => [key, filter[key]])) as MemberNarrowing;
