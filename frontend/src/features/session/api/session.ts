import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { PasswordChange, SessionDto, SetUp, SignIn } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { sessionKey } from '../../../lib/query-client.js';
import { tellOtherWindows } from '../other-windows.js';

export const sessionQuery = () =>
  queryOptions({ queryKey: sessionKey, queryFn: ({ signal }) => api.get<SessionDto>('/session', undefined, signal), staleTime: 60_000 });
export const useSession = () => useQuery(sessionQuery());

/** Signing in keeps nothing of whoever was here before; who signs in again over their page finds it as it was. */
export function useOpenSession<T>(path: string, samePerson = false) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: T) => api.postPublic<SessionDto>(path, body),
    onSuccess: (session) => {
      if (!samePerson) client.removeQueries({ predicate: (q) => q.queryKey[0] !== sessionKey[0] });
      client.setQueryData(sessionKey, session);
      if (session.user) tellOtherWindows(session.user.id);
    },
  });
}
export const useSignIn = (samePerson: boolean) => useOpenSession<SignIn>('/session', samePerson);
export const useSetUp = () => useOpenSession<SetUp>('/set-up');

/** Whoever signs out leaves the document as well, and with it everything that was fetched. */
export const useSignOut = () => useMutation({ mutationFn: () => api.delete('/session') });
/** The server ends the other sessions with it. */
export const useChangePassword = () => useMutation({ mutationFn: (body: PasswordChange) => api.put('/session/password', body) });
