import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { UserDto, UserInput, UserUpdate } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';

const usersKey = ['users'] as const;
export const usersQuery = () => queryOptions({ queryKey: usersKey, queryFn: ({ signal }) => api.get<UserDto[]>('/users', undefined, signal) });
export const useUsers = (enabled: boolean) => useQuery({ ...usersQuery(), enabled });

function useUserMutation<Body>(send: (body: Body) => Promise<UserDto>) {
  const client = useQueryClient();
  return useMutation({ mutationFn: send, onSuccess: () => client.invalidateQueries({ queryKey: usersKey }) });
}
export const useCreateUser = () => useUserMutation((body: UserInput) => api.post<UserDto>('/users', body));
export const useUpdateUser = (userId: string) => useUserMutation((body: UserUpdate) => api.patch<UserDto>(`/users/${userId}`, body));
