import type { OpenItemDto } from '@mantlet/common';

/** More ids than this make an address too long to keep; the zone and "open" then narrow the list instead. */
const mostIdsInAddress = 40;

/** The place where an open item is settled. Search parameters are the members page's own query (MemberQuery). */
export function openItemLink(projectId: string, item: Pick<OpenItemDto, 'page' | 'memberIds' | 'zoneId'>): string {
  const at = `/projects/${projectId}`;
  const zone = item.zoneId ? `?zone=${item.zoneId}` : '';
  const [only] = item.memberIds;
  if (item.page === 'member' && item.memberIds.length === 1 && only) return `${at}/members/${only}`;
  if (item.page === 'member' || item.page === 'members') {
    if (item.memberIds.length > 0 && item.memberIds.length <= mostIdsInAddress) return `${at}/members?memberIds=${item.memberIds.join(',')}`;
    return `${at}/members?open=true${item.zoneId ? `&zoneIds=${item.zoneId}` : ''}`;
  }
  return item.page === 'zones' ? `${at}/zones${zone}` : `${at}/${item.page}`;
}
