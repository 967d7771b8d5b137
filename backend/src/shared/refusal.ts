import { HttpException, HttpStatus } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { ErrorDto, Message } from '@mantlet/common';

export type ErrorBody = ErrorDto;
export type Issue = NonNullable<ErrorDto['issues']>[number];
/** Who made a change, and when (ISO 8601). */
export interface Trace {
  by: string;
  at: string;
}

/** A refusal with a sentence for people. */
export class Refusal extends HttpException {
  constructor(status: HttpStatus, reason: Message, extra: Pick<ErrorBody, 'issues' | 'current' | 'by' | 'at'> = {}) {
    super({ message: sentence(reason), code: reason.code, ...extra } satisfies ErrorBody, status);
  }
}

export const notFound = (what: string): Refusal => new Refusal(HttpStatus.NOT_FOUND, message('shared.not-found', { what }));
export const conflict = (reason: Message): Refusal => new Refusal(HttpStatus.CONFLICT, reason);
export const unprocessable = (reason: Message, issues?: Issue[]): Refusal =>
  new Refusal(HttpStatus.UNPROCESSABLE_ENTITY, reason, issues ? { issues } : {});

/** An edit of something that was saved by another meanwhile: shows what stands, and who saved it. */
export const stale = (what: string, current: unknown, trace: Trace | null): Refusal =>
  new Refusal(HttpStatus.CONFLICT, message('shared.stale', { what }), { current, ...trace });
