import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { InvitationInput, UserDto, UserUpdate } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';

const usersKey = ['users'] as const;
/** While an invitation is open its mail may still fail, or be accepted: asked for again by itself. */
export const usersQuery = () =>
  queryOptions({
    queryKey: usersKey, queryFn: ({ signal }) => api.get<UserDto[]>('/users', undefined, signal),
    refetchInterval: ({ state }) => (state.data?.some((user) => user.state === 'invited') ? 10_000 : false),
  });
export const useUsers = (enabled: boolean) => useQuery({ ...usersQuery(), enabled });

function useUserMutation<Body, Result = UserDto>(send: (body: Body) => Promise<Result>) {
  const client = useQueryClient();
  return useMutation({ mutationFn: send, onSuccess: () => client.invalidateQueries({ queryKey: usersKey }) });
}
export const useInvite = () => useUserMutation((body: InvitationInput) => api.post<UserDto>('/users', body));
export const useUpdateUser = (userId: string) => useUserMutation((body: UserUpdate) => api.patch<UserDto>(`/users/${userId}`, body));
export const useInviteAgain = () => useUserMutation((userId: string) => api.post<UserDto>(`/users/${userId}/invitation`, {}));
export const useWithdraw = () => useUserMutation<string, void>((userId) => api.delete(`/users/${userId}/invitation`));
