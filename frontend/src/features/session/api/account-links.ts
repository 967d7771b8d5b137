import { queryOptions, useMutation, useQuery } from '@tanstack/react-query';
import type { AccountLink, AccountLinkDto, AccountLinkUse, ResetRequest } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { useOpenSession } from './session.js';

export const useAskForReset = () => useMutation({ mutationFn: (body: ResetRequest) => api.postPublic('/password-resets', body) });

/** Whose link it is. Sent as a body, so that the token stands in no address. */
export const accountLinkQuery = (link: AccountLink) =>
  queryOptions({ queryKey: ['account-link', link.purpose, link.token], queryFn: () => api.postPublic<AccountLinkDto>('/account-links/look-up', link), retry: false, staleTime: Infinity, refetchOnWindowFocus: false });
/** used: the link is being spent, so that asking whose it is would find it over */
export const useAccountLink = (link: AccountLink, used: boolean) => useQuery({ ...accountLinkQuery(link), enabled: link.token !== '' && !used });
export const useUseLink = () => useOpenSession<AccountLinkUse>('/account-links/use');
