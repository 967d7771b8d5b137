import { Catch, HttpException, HttpStatus, Logger } from '@nestjs/common';
import type { ArgumentsHost, ExceptionFilter } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { Message } from '@mantlet/common';
import type { Response } from 'express';
import { EntityNotFoundError, QueryFailedError } from 'typeorm';
import type { ErrorBody } from './refusal.js';

const body = (reason: Message): ErrorBody => ({ message: sentence(reason), code: reason.code });

/** PostgreSQL's own refusals that stand for a person's mistake rather than ours. */
function fromDatabase(error: QueryFailedError): { status: HttpStatus; body: ErrorBody } | null {
  const { code, detail } = error.driverError as { code?: string; detail?: string };
  if (code === '23505') {
    const value = /\((?:[^)]*, )?([^),]*)\) already exists/.exec(detail ?? '')?.[1] ?? '';
    return { status: HttpStatus.CONFLICT, body: body(message('shared.exists', { what: 'entry', name: value })) };
  }
  if (code === '23503') return { status: HttpStatus.CONFLICT, body: body(message('shared.in-use', { what: 'entry', by: 'something else in the project' })) };
  if (code === '23514') return { status: HttpStatus.UNPROCESSABLE_ENTITY, body: body(message('shared.invalid', { where: 'Input', problem: 'a value is outside what is possible' })) };
  // text that PostgreSQL cannot hold: NUL bytes, half of a surrogate pair in jsonb, or numbers beyond their type
  if (code === '22021' || code === '22P02' || code === '22P05' || code === '22003') {
    return { status: HttpStatus.BAD_REQUEST, body: body(message('shared.invalid', { where: 'Input', problem: 'holds a character or number that cannot be stored' })) };
  }
  return null;
}

/** Turns every fault into a status and a sentence; only what nobody foresaw is logged and answered 500. */
@Catch()
export class ErrorFilter implements ExceptionFilter {
  private readonly logger = new Logger('Error');

  catch(error: unknown, host: ArgumentsHost): void {
    const response = host.switchToHttp().getResponse<Response>();
    if (response.headersSent) {
      response.end();
      return;
    }
    const { status, body: answer } = this.describe(error);
    response.status(status).json(answer);
  }

  private describe(error: unknown): { status: number; body: ErrorBody } {
    if (error instanceof HttpException) {
      const given = error.getResponse();
      const known = typeof given === 'object' && 'code' in given ? (given as ErrorBody) : null;
      return { status: error.getStatus(), body: known ?? this.plain(error) };
    }
    if (error instanceof QueryFailedError) {
      const known = fromDatabase(error);
      if (known) return known;
    }
    if (error instanceof EntityNotFoundError) return { status: HttpStatus.NOT_FOUND, body: body(message('shared.not-found', { what: 'entry' })) };
    // body-parser and its kin speak in `status` and `expose`
    const thrown = error as { status?: number; expose?: boolean; message?: string };
    if (thrown.expose && thrown.status && thrown.status < 500) {
      const problem = thrown.status === 413 ? 'is too large' : 'could not be read';
      return { status: thrown.status, body: body(message('shared.invalid', { where: 'Request', problem })) };
    }
    this.logger.error(error instanceof Error ? error.stack : String(error));
    return { status: HttpStatus.INTERNAL_SERVER_ERROR, body: body(message('shared.unexpected', {})) };
  }

  private plain(error: HttpException): ErrorBody {
    if (error.getStatus() === HttpStatus.TOO_MANY_REQUESTS) return body(message('shared.too-many-requests', {}));
    if (error.getStatus() === HttpStatus.PAYLOAD_TOO_LARGE) return body(message('shared.invalid', { where: 'File', problem: 'is larger than this page accepts' }));
    if (error.getStatus() === HttpStatus.NOT_FOUND) return body(message('shared.not-found', { what: 'page' }));
    return { message: error.message, code: 'shared.invalid' };
  }
}
