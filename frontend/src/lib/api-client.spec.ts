import { afterEach, describe, expect, it, vi } from 'vitest';
import { api, ApiError, apiUrl, onSignedOut, queryString } from './api-client.js';

const answer = (status: number, body: string | null, type = 'application/json') =>
  vi.stubGlobal('fetch', vi.fn(async () => new Response(body, { status, headers: { 'content-type': type } })));
const failure = async (call: Promise<unknown>): Promise<ApiError> => {
  const error: unknown = await call.then(() => null, (e: unknown) => e);
  expect(error).toBeInstanceOf(ApiError);
  return error as ApiError;
};

describe('the API client', () => {
  afterEach(() => onSignedOut(() => undefined));

  it('sends JSON with the session and gives the parsed answer', async () => {
    answer(200, '{"id":"a"}');
    await expect(api.post('/projects', { name: 'House' })).resolves.toEqual({ id: 'a' });
    expect(fetch).toHaveBeenCalledWith('/api/projects', expect.objectContaining({ method: 'POST', credentials: 'same-origin', body: '{"name":"House"}' }));
  });
  it('gives nothing for an empty answer', async () => {
    answer(204, null);
    await expect(api.delete('/session')).resolves.toBeUndefined();
  });
  it('keeps the sentence, the code and the issues of a refusal', async () => {
    answer(400, JSON.stringify({ message: 'Height: must be above 0', code: 'shared.invalid', issues: [{ path: 'heightM', message: 'must be above 0' }, 'rubbish'] }));
    const error = await failure(api.post('/x', {}));
    expect(error).toMatchObject({ status: 400, message: 'Height: must be above 0', code: 'shared.invalid', issues: [{ path: 'heightM', message: 'must be above 0' }] });
  });
  it.each([[403, 'isRefused'], [404, 'isMissing'], [401, 'isSignedOut']] as const)('knows what %i means', async (status, what) => {
    answer(status, JSON.stringify({ message: 'No.' }));
    expect((await failure(api.get('/x')))[what]).toBe(true);
  });
  it('says something useful when the answer is no JSON, or strange', async () => {
    answer(502, '<html>bad gateway</html>', 'text/html');
    expect((await failure(api.get('/x'))).message).toMatch(/answered 502/);
    answer(200, '<html>');
    expect((await failure(api.get('/x'))).message).toMatch(/not data/);
  });
  it('says that the server cannot be reached', async () => {
    vi.stubGlobal('fetch', vi.fn(async () => { throw new TypeError('Failed to fetch'); }));
    const error = await failure(api.put('/x', { a: 1 }));
    expect(error.status).toBe(0);
    expect(error.message).toMatch(/cannot be reached/);
  });
  it('tells of an ended session, but not of a wrong password', async () => {
    const ended = vi.fn();
    onSignedOut(ended);
    answer(401, JSON.stringify({ message: 'You are not signed in.' }));
    await failure(api.postPublic('/session', {}));
    expect(ended).not.toHaveBeenCalled();
    await failure(api.get('/projects'));
    expect(ended).toHaveBeenCalledOnce();
  });
  it('sends a file with its fields as multipart, the file last', async () => {
    answer(200, '{}');
    await api.upload('/imports', new File(['a'], 'a.csv'), { sheet: '1' });
    const body = vi.mocked(fetch).mock.calls[0]?.[1]?.body as FormData;
    expect([...body.keys()]).toEqual(['sheet', 'file']);
  });
  it('joins lists and leaves out what is empty', () => {
    expect(queryString({ ids: ['a', 'b'], none: [], search: '', page: 2, open: undefined })).toBe('?ids=a%2Cb&page=2');
    expect(apiUrl('/projects/1/quantities.xlsx')).toBe('/api/projects/1/quantities.xlsx');
  });
});
