import { Catch, HttpException, HttpStatus, Logger } from '@nestjs/common';
import type { ArgumentsHost, ExceptionFilter } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { Message } from '@mantlet/common';
import type { Request, Response } from 'express';
import { EntityNotFoundError, QueryFailedError } from 'typeorm';
import type { ErrorBody } from './refusal.js';

const body = (reason: Message): ErrorBody => ({ message: sentence(reason), code: reason.code });

/** what PostgreSQL cannot hold: NUL bytes, half of a surrogate pair in jsonb, numbers beyond their type, dates before its calendar */
const unstorable = new Set(['22021', '22P02', '22P05', '22003', '22007', '22008']);

/** PostgreSQL's own refusals that stand for a person's mistake rather than ours. */
function fromDatabase(error: QueryFailedError): { status: HttpStatus; body: ErrorBody } | null {
  const { code, detail } = error.driverError as { code?: string; detail?: string };
  if (code === '23505') {
    const value = /\((?:[^)]*, )?([^),]*)\) already exists/.exec(detail ?? '')?.[1] ?? '';
    return { status: HttpStatus.CONFLICT, body: body(message('shared.exists', { what: 'entry', name: value })) };
  }
  if (code === '23503') return { status: HttpStatus.CONFLICT, body: body(message('shared.in-use', { what: 'entry', by: 'something else in the project' })) };
  if (code === '23514') return { status: HttpStatus.UNPROCESSABLE_ENTITY, body: body(message('shared.invalid', { where: 'Input', problem: 'a value is outside what is possible' })) };
  if (code && unstorable.has(code)) {
    return { status: HttpStatus.BAD_REQUEST, body: body(message('shared.invalid', { where: 'Input', problem: 'holds a character, number or date that cannot be stored' })) };
  }
  // two transactions that waited for each other, or one that could not be set among the others: the database undid this one
  if (code === '40P01' || code === '40001' || code === '55P03') return { status: HttpStatus.CONFLICT, body: body(message('shared.busy', {})) };
  if (code === '57014') return { status: HttpStatus.SERVICE_UNAVAILABLE, body: body(message('shared.took-too-long', {})) };
  return null;
}

/** What a library refused before any of our code saw it: its own words are for programmers. */
function plain(status: number, request: Request): ErrorBody {
  const upload = request.headers['content-type']?.startsWith('multipart/') ?? false;
  if (status === Number(HttpStatus.TOO_MANY_REQUESTS)) return body(message('shared.too-many-requests', {}));
  if (status === Number(HttpStatus.NOT_FOUND)) return body(message('shared.not-found', { what: 'page' }));
  if (status === Number(HttpStatus.PAYLOAD_TOO_LARGE)) return body(message('shared.too-large', { what: upload ? 'file' : 'input' }));
  return body(upload ? message('shared.upload-unreadable', {}) : message('shared.unreadable', {}));
}

/** Turns every fault into a status and a sentence; only what nobody foresaw is logged and answered 500. */
@Catch()
export class ErrorFilter implements ExceptionFilter {
  private readonly logger = new Logger('Error');

  catch(error: unknown, host: ArgumentsHost): void {
    const http = host.switchToHttp();
    const response = http.getResponse<Response>();
    if (response.headersSent) {
      response.end();
      return;
    }
    const { status, body: answer } = this.describe(error, http.getRequest<Request>());
    response.status(status).json(answer);
  }

  private describe(error: unknown, request: Request): { status: number; body: ErrorBody } {
    if (error instanceof HttpException) {
      const given = error.getResponse();
      const known = typeof given === 'object' && 'code' in given ? (given as ErrorBody) : null;
      return { status: error.getStatus(), body: known ?? plain(error.getStatus(), request) };
    }
    if (error instanceof QueryFailedError) {
      const known = fromDatabase(error);
      if (known) return known;
    }
    if (error instanceof EntityNotFoundError) return { status: HttpStatus.NOT_FOUND, body: body(message('shared.not-found', { what: 'entry' })) };
    // body-parser and its kin speak in `status` and `expose`
    const thrown = error as { status?: number; expose?: boolean; message?: string };
    if (thrown.expose && thrown.status && thrown.status < 500) return { status: thrown.status, body: plain(thrown.status, request) };
    this.logger.error(error instanceof Error ? error.stack : String(error));
    return { status: HttpStatus.INTERNAL_SERVER_ERROR, body: body(message('shared.unexpected', {})) };
  }
}
