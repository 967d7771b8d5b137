import { HttpStatus, Injectable } from '@nestjs/common';
import type { ExecutionContext } from '@nestjs/common';
import { message } from '@mantlet/common';
import { ThrottlerGuard } from '@nestjs/throttler';
import type { ThrottlerLimitDetail, ThrottlerOptions } from '@nestjs/throttler';
import type { Response } from 'express';
import type { ScopedRequest } from '../../shared/access.js';
import { Refusal } from '../../shared/refusal.js';

const MINUTE = 60_000;
/** the account that is tried, as the request names it, whether it exists or not; or the link; or whoever is signed in */
function subject(request: ScopedRequest): string {
  const { email, token } = (request.body ?? {}) as { email?: unknown; token?: unknown };
  return [email, token].map((one) => (typeof one === 'string' ? one.trim().toLowerCase().slice(0, 254) : '')).find(Boolean) ?? request.user?.id ?? '';
}
const address = (request: ScopedRequest): string => request.ip ?? '';
const tracked = (by: (request: ScopedRequest) => string): ThrottlerOptions['getTracker'] => (request) => by(request as unknown as ScopedRequest);

/**
 * One address may try one account ten times a minute, and all accounts together three hundred times in five minutes.
 * One account may be tried thirty times a minute from everywhere; what an address tries beyond its ten is not counted there,
 * so that keeping somebody out takes several addresses, and lasts only as long as they go on.
 */
export const accountThrottlers: ThrottlerOptions[] = [
  { name: 'pair', ttl: MINUTE, limit: 10, getTracker: tracked((request) => `${address(request)} ${subject(request)}`) },
  { name: 'account', ttl: MINUTE, limit: 30, getTracker: tracked(subject) },
  { name: 'address', ttl: 5 * MINUTE, limit: 300, getTracker: tracked(address) },
];

/** Slows down guessing, without a word on whether there is such an account. */
@Injectable()
export class AccountThrottlerGuard extends ThrottlerGuard {
  protected override throwThrottlingException(context: ExecutionContext, { timeToBlockExpire }: ThrottlerLimitDetail): Promise<void> {
    const seconds = Math.max(1, timeToBlockExpire);
    context.switchToHttp().getResponse<Response>().setHeader('Retry-After', String(seconds));
    throw new Refusal(HttpStatus.TOO_MANY_REQUESTS, message('account.too-many-attempts', { seconds }));
  }
}
