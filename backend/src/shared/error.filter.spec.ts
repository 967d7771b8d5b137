import type { ArgumentsHost } from '@nestjs/common';
import { Logger } from '@nestjs/common';
import { QueryFailedError } from 'typeorm';
import { ErrorFilter } from './error.filter.js';

/** What a person is told of a fault of the database, by its SQLSTATE (PostgreSQL documentation, appendix A). */
function answerTo(code: string): { status: number; body: { message: string; code: string } } {
  const answer = { status: 0, body: { message: '', code: '' } };
  const response = {
    headersSent: false,
    status(status: number) { answer.status = status; return this; },
    json(body: { message: string; code: string }) { answer.body = body; },
  };
  const host = { switchToHttp: () => ({ getResponse: () => response, getRequest: () => ({ headers: {} }) }) } as unknown as ArgumentsHost;
  new ErrorFilter().catch(new QueryFailedError('SELECT 1', [], Object.assign(new Error('text of the database'), { code })), host);
  return answer;
}

describe('faults of the database', () => {
  it.each([
    ['a deadlock', '40P01', 409], ['a serialisation failure', '40001', 409], ['a lock not had', '55P03', 409], ['a statement stopped', '57014', 503],
    ['a foreign key', '23503', 409], ['a check', '23514', 422], ['text that cannot be stored', '22021', 400],
  ])('%s is told in a sentence', (_, code, status) => {
    const answer = answerTo(code);
    expect(answer.status).toBe(status);
    expect(answer.body.message).not.toMatch(/text of the database/);
  });

  it('of which another try may get over says so', () => {
    expect(answerTo('40P01').body).toEqual({ message: 'Somebody else was changing the same things at that moment. Nothing was changed; try again.', code: 'shared.busy' });
  });

  it('that nobody foresaw is logged, and kept from people', () => {
    const logged = jest.spyOn(Logger.prototype, 'error').mockImplementation(() => undefined);
    expect(answerTo('XX000')).toMatchObject({ status: 500, body: { code: 'shared.unexpected' } });
    expect(logged).toHaveBeenCalledTimes(1);
    logged.mockRestore();
  });
});
