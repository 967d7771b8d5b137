import { useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { LiveTopic, ProjectEventDto } from '@mantlet/common';
import { projectKey } from '../../lib/query-client.js';
import { projectListKey } from '../projects/api/projects.js';
import { followProject } from './api/live-stream.js';
import { queriesTouched, touchesProjectList } from './live-queries.js';

/** a connection that blinks is not worth a word */
const PATIENCE_MS = 4000;
/** without the stream, what is shown is asked for again this often */
const POLL_MS = 60_000;
const SAID_MS = 8000;
/** changes that come together are asked for together; then not again at once, or a slow answer would never arrive */
const FIRST_WAIT_MS = 100;
const NEXT_WAIT_MS = 1500;

export interface Live {
  /** false: what is shown may be older than the server's */
  live: boolean;
  /** what somebody else just did */
  said: string | null;
}

/** Keeps the pages of a project as the server has it, and tells what others do. */
export function useLiveProject(projectId: string, userId: string | null): Live {
  const client = useQueryClient();
  const [live, setLive] = useState(true);
  const [said, setSaid] = useState<string | null>(null);
  useEffect(() => {
    if (typeof EventSource === 'undefined' || userId === null) return;
    const refresh = refresher(client, projectId);
    const patience = patient(setLive, () => void client.invalidateQueries({ queryKey: projectKey(projectId) }));
    let saying: ReturnType<typeof setTimeout> | undefined;
    const stop = followProject(projectId, {
      connected: (missed) => {
        patience.connected();
        if (missed) void client.invalidateQueries({ queryKey: projectKey(projectId) });
      },
      changed: (event) => {
        const own = event.by?.id === userId;
        // a save of this very page asks for everything anew when it is answered
        if (!own || client.isMutating() === 0) refresh.ask(event);
        if (own || event.text === null) return;
        setSaid(event.text);
        clearTimeout(saying);
        saying = setTimeout(() => setSaid(null), SAID_MS);
      },
      disconnected: () => {
        patience.disconnected();
        // says so where the session or the right to be here has ended
        void client.invalidateQueries({ queryKey: projectKey(projectId, 'self') });
      },
    });
    return () => {
      stop();
      refresh.stop();
      patience.stop();
      clearTimeout(saying);
      setSaid(null);
      setLive(true);
    };
  }, [client, projectId, userId]);
  return { live, said };
}

/** Collects what is to be asked for again. */
function refresher(client: QueryClient, projectId: string) {
  const waiting = new Set<LiveTopic>();
  let timer: ReturnType<typeof setTimeout> | undefined;
  let last = 0;
  const flush = () => {
    timer = undefined;
    last = Date.now();
    const topics = [...waiting];
    const touched = new Set<unknown>(queriesTouched(topics));
    waiting.clear();
    void client.invalidateQueries({ queryKey: projectKey(projectId), predicate: ({ queryKey }) => touched.has(queryKey[2]) });
    if (touchesProjectList(topics)) void client.invalidateQueries({ queryKey: projectListKey });
  };
  return {
    ask: ({ topics }: ProjectEventDto) => {
      for (const topic of topics) waiting.add(topic);
      timer ??= setTimeout(flush, Math.max(FIRST_WAIT_MS, last + NEXT_WAIT_MS - Date.now()));
    },
    stop: () => clearTimeout(timer),
  };
}

/** Says that the page is not live only after a while, and polls until it is again. */
function patient(setLive: (live: boolean) => void, poll: () => void) {
  let patience: ReturnType<typeof setTimeout> | undefined;
  let polling: ReturnType<typeof setInterval> | undefined;
  const stop = () => {
    clearTimeout(patience);
    clearInterval(polling);
    patience = polling = undefined;
  };
  return {
    connected: () => { stop(); setLive(true); },
    disconnected: () => {
      patience ??= setTimeout(() => setLive(false), PATIENCE_MS);
      polling ??= setInterval(poll, POLL_MS);
    },
    stop,
  };
}
