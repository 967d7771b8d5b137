import type { ProjectEventDto, StreamReadyDto } from '@mantlet/common';
import { apiUrl } from '../../../lib/api-client.js';

const FIRST_RETRY_MS = 1000;
const LONGEST_RETRY_MS = 15_000;
/** a page nobody looks at lets its connection go: a browser has six for all of its windows */
const HIDDEN_MS = 60_000;

export interface StreamHandlers {
  /** Everything from now on is heard. `missed`: what was read before may be old. */
  connected: (missed: boolean) => void;
  changed: (event: ProjectEventDto) => void;
  /** Nothing is heard until the next `connected`; called again at each attempt that fails. */
  disconnected: () => void;
}

/** Listens to a project's changes and comes back by itself, however the connection ends. @returns stops it */
export function followProject(projectId: string, handlers: StreamHandlers): () => void {
  let source: EventSource | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let retryMs = FIRST_RETRY_MS;
  let heardBefore = false;

  const close = () => {
    source?.close();
    source = null;
    clearTimeout(timer);
  };
  const again = () => {
    close();
    handlers.disconnected();
    timer = setTimeout(open, retryMs);
    retryMs = Math.min(retryMs * 2, LONGEST_RETRY_MS);
  };
  const open = () => {
    close();
    source = new EventSource(apiUrl(`/projects/${projectId}/events`));
    source.addEventListener('ready', ({ data }: MessageEvent<string>) => {
      handlers.connected(heardBefore || (JSON.parse(data) as StreamReadyDto).missed);
      heardBefore = true;
      retryMs = FIRST_RETRY_MS;
    });
    source.addEventListener('change', ({ data }: MessageEvent<string>) => handlers.changed(JSON.parse(data) as ProjectEventDto));
    // the server says goodbye where rights or the session have changed, and when it stops itself
    source.addEventListener('closed', again);
    source.onerror = again;
  };
  const onVisibility = () => {
    if (document.visibilityState === 'hidden') {
      clearTimeout(timer);
      timer = setTimeout(close, HIDDEN_MS);
    } else if (source === null) {
      retryMs = FIRST_RETRY_MS;
      open();
    } else clearTimeout(timer);
  };
  document.addEventListener('visibilitychange', onVisibility);
  open();
  return () => {
    document.removeEventListener('visibilitychange', onVisibility);
    close();
  };
}
