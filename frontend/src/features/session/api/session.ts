import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { PasswordChange, SessionDto, SetUp, SignIn } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { sessionKey } from '../../../lib/query-client.js';

export const sessionQuery = () =>
  queryOptions({ queryKey: sessionKey, queryFn: ({ signal }) => api.get<SessionDto>('/session', undefined, signal), staleTime: 60_000 });
export const useSession = () => useQuery(sessionQuery());

/** Signing in keeps nothing of whoever was here before. */
function useOpenSession<T>(path: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: T) => api.postPublic<SessionDto>(path, body),
    onSuccess: (session) => {
      client.removeQueries({ predicate: (q) => q.queryKey[0] !== sessionKey[0] });
      client.setQueryData(sessionKey, session);
    },
  });
}
export const useSignIn = () => useOpenSession<SignIn>('/session');
export const useSetUp = () => useOpenSession<SetUp>('/set-up');

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => api.delete('/session'),
    onSuccess: () => {
      client.setQueryData<SessionDto>(sessionKey, { user: null, needsSetUp: false });
      client.removeQueries({ predicate: (q) => q.queryKey[0] !== sessionKey[0] });
    },
  });
}
export const useChangePassword = () => useMutation({ mutationFn: (body: PasswordChange) => api.put('/session/password', body) });
