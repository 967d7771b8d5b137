import type { MemberResultDto } from '@mantlet/common';
import type { MemberCase } from '../types.js';
import { assessMember } from './assess.js';

/** Many members at once, in their order: the same results as one by one. */
export function assessMembers(cases: readonly MemberCase[]): MemberResultDto[] {
  return cases.map((c) => assessMember(c));
}
