import type { JobDto } from '@mantlet/common';
import { formatNumber } from '../../lib/format.js';

/** Never 100 while something is left. */
export const percentOf = ({ done, total }: JobDto): number => (total === 0 ? 0 : Math.min(99, Math.floor((done / total) * 100)));

const members = (n: number): string => (n === 1 ? '1 member' : `${formatNumber(n)} members`);
function left(seconds: number): string {
  if (seconds < 10) return 'a few seconds left';
  return seconds < 90 ? `about ${Math.ceil(seconds / 10) * 10} s left` : `about ${Math.ceil(seconds / 60)} min left`;
}

export function sayJob(job: JobDto): string {
  const { state, total, done, secondsLeft, withoutWorker, error } = job;
  if (state === 'failed') return error ?? 'The recalculation failed. Try again.';
  const incomplete = 'Their results and all totals are open until then.';
  if (withoutWorker) return `${members(total - done)} ${total - done === 1 ? 'waits' : 'wait'} to be recalculated: no worker is running, and the administrator can start one. ${incomplete}`;
  if (state === 'waiting') return `${members(total)} ${total === 1 ? 'waits' : 'wait'} to be recalculated. ${incomplete}`;
  return `Recalculating ${members(total)}: ${percentOf(job)} %${secondsLeft === null ? '' : `, ${left(secondsLeft)}`}. ${incomplete}`;
}
