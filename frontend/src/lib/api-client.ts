/**
 * The only place that talks to the server. Paths are given without the leading /api.
 * Every failure is an ApiError whose message is a sentence for people.
 */
export interface ApiIssue {
  path: string;
  message: string;
}

/** Sent with a refusal of an edit that somebody else's save overtook. */
export interface Overtaken {
  /** what stands now */
  current: unknown;
  /** who saved it, and when; null where the server does not know */
  by: string | null;
  at: string | null;
}

export class ApiError extends Error {
  override name = 'ApiError';
  constructor(
    /** HTTP status; 0 where no answer came */
    readonly status: number,
    message: string,
    readonly issues: ApiIssue[] = [],
    readonly code: string | null = null,
    readonly overtaken: Overtaken | null = null,
  ) {
    super(message);
  }
  get isRefused() { return this.status === 403; }
  get isMissing() { return this.status === 404; }
  /** Somebody else saved it meanwhile. Other conflicts (a name that is taken) show no version. */
  get isStale() { return this.overtaken !== null; }
  /** No answer, or one from something between here and the server: the request may have been carried out all the same. */
  get isUnanswered() { return this.status === 0 || this.status === 502 || this.status === 504; }
  /** The same again may well go through. */
  get isPassing() { return this.status === 0 || this.status === 429 || this.status >= 500 || this.code === 'shared.busy'; }
  get isSignedOut() { return this.status === 401; }
}

type QueryValue = string | number | boolean | readonly (string | number)[] | null | undefined;
export type Query = Record<string, QueryValue>;

/** Lists travel comma-separated; what is empty is left out. */
export function queryString(query: Query = {}): string {
  const params = new URLSearchParams();
  for (const [key, value] of Object.entries(query)) {
    if (value == null || value === '') continue;
    if (Array.isArray(value)) {
      if (value.length > 0) params.set(key, value.join(','));
    } else params.set(key, String(value));
  }
  const text = params.toString();
  return text ? `?${text}` : '';
}

/** Address of something the browser itself opens or downloads: a PDF, a CSV, an evidence file. */
export const apiUrl = (path: string, query?: Query): string => `/api${path}${queryString(query)}`;

let signedOutListener: () => void = () => undefined;
/** Called when a request that needs a session is answered with 401. */
export function onSignedOut(listener: () => void): void {
  signedOutListener = listener;
}

const noAnswer = 'The server cannot be reached. Check the connection and try again; what you typed is still here.';
const strangeAnswer = (status: number) =>
  `The server answered ${status} without saying why. Try again, and tell the administrator if it stays.`;

async function errorOf(response: Response): Promise<ApiError> {
  const body: unknown = await response.json().catch(() => null);
  const said = (body ?? {}) as { message?: unknown; code?: unknown; issues?: unknown; current?: unknown; by?: unknown; at?: unknown };
  const issues = Array.isArray(said.issues)
    ? said.issues.filter((i): i is ApiIssue => typeof i?.path === 'string' && typeof i?.message === 'string')
    : [];
  const message = typeof said.message === 'string' && said.message ? said.message : strangeAnswer(response.status);
  const text = (value: unknown) => (typeof value === 'string' ? value : null);
  const overtaken = response.status === 409 && said.current != null ? { current: said.current, by: text(said.by), at: text(said.at) } : null;
  return new ApiError(response.status, message, issues, text(said.code), overtaken);
}

async function send<T>(path: string, init: RequestInit, quiet401 = false): Promise<T> {
  let response: Response;
  try {
    response = await fetch(`/api${path}`, { credentials: 'same-origin', ...init });
  } catch (cause) {
    if (init.signal?.aborted) throw cause;
    throw new ApiError(0, noAnswer);
  }
  if (!response.ok) {
    const error = await errorOf(response);
    if (error.isSignedOut && !quiet401) signedOutListener();
    throw error;
  }
  if (response.status === 204) return undefined as T;
  const text = await response.text();
  if (!text) return undefined as T;
  try {
    return JSON.parse(text) as T;
  } catch {
    throw new ApiError(response.status, 'The server sent something that is not data. Load the page again.');
  }
}

const json = (method: string, body: unknown): RequestInit =>
  body === undefined ? { method } : { method, headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) };

export const api = {
  get: <T>(path: string, query?: Query, signal?: AbortSignal) => send<T>(path + queryString(query), signal ? { signal } : {}),
  post: <T = void>(path: string, body?: unknown) => send<T>(path, json('POST', body)),
  put: <T = void>(path: string, body?: unknown) => send<T>(path, json('PUT', body)),
  patch: <T = void>(path: string, body?: unknown) => send<T>(path, json('PATCH', body)),
  delete: <T = void>(path: string, body?: unknown) => send<T>(path, json('DELETE', body)),
  /** For signing in, where 401 means a wrong password and not an ended session. */
  postPublic: <T = void>(path: string, body?: unknown) => send<T>(path, json('POST', body), true),
  /** Multipart: the file under `file` and any further text fields. */
  upload: <T>(path: string, file: File, fields: Record<string, string> = {}, method: 'POST' | 'PUT' = 'POST') => {
    const form = new FormData();
    // fields first: a server that streams the upload then knows them when the file begins
    for (const [key, value] of Object.entries(fields)) form.append(key, value);
    form.append('file', file);
    return send<T>(path, { method, body: form });
  },
};
