import { HttpException, HttpStatus } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { Message } from '@mantlet/common';

export interface Issue {
  path: string;
  message: string;
}
/** What every error answer carries: a sentence, its code, and the fields it concerns. */
export interface ErrorBody {
  message: string;
  code: string;
  issues?: Issue[];
  /** the version on the server, where a stale one was sent */
  current?: unknown;
}

/** A refusal with a sentence for people. */
export class Refusal extends HttpException {
  constructor(status: HttpStatus, reason: Message, extra: Pick<ErrorBody, 'issues' | 'current'> = {}) {
    super({ message: sentence(reason), code: reason.code, ...extra } satisfies ErrorBody, status);
  }
}

export const notFound = (what: string): Refusal => new Refusal(HttpStatus.NOT_FOUND, message('shared.not-found', { what }));
export const conflict = (reason: Message): Refusal => new Refusal(HttpStatus.CONFLICT, reason);
export const unprocessable = (reason: Message, issues?: Issue[]): Refusal =>
  new Refusal(HttpStatus.UNPROCESSABLE_ENTITY, reason, issues ? { issues } : {});

/** Refuses an edit of something that was saved by another meanwhile, and shows the version that stands. */
export function requireVersion(what: string, standing: { version: number }, sent: number, current: unknown = standing): void {
  if (standing.version !== sent) {
    throw new Refusal(HttpStatus.CONFLICT, message('shared.stale', { what }), { current });
  }
}
