import { Injectable } from '@nestjs/common';
import { ThrottlerGuard } from '@nestjs/throttler';
import type { Request } from 'express';

/** Counts attempts per address and account, so that one guesser does not lock everybody out. */
@Injectable()
export class SignInThrottlerGuard extends ThrottlerGuard {
  protected override getTracker(request: Request): Promise<string> {
    const body = request.body as { email?: unknown } | undefined;
    return Promise.resolve(`${request.ip ?? ''} ${String(body?.email ?? '').toLowerCase().slice(0, 254)}`);
  }
}
