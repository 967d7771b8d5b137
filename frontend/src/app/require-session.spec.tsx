import { act, screen, waitFor } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { leaveToSomebodyElse } from '../features/session/other-windows.js';
import { renderPage, serve } from '../test/render.js';
import { RequireSession } from './require-session.js';

vi.mock(import('../features/session/other-windows.js'), async (original) => ({ ...(await original()), leaveToSomebodyElse: vi.fn() }));

const person = (id: string) => ({ id, name: `Person ${id}`, email: `${id}@example.test`, administrator: false });
const otherWindowSays = (newValue: string) => act(() => { window.dispatchEvent(new StorageEvent('storage', { key: 'mantlet.signed-in', newValue })); });

describe('a page that stays open', () => {
  let signedIn: ReturnType<typeof person> | null;
  beforeEach(() => {
    vi.mocked(leaveToSomebodyElse).mockClear();
    signedIn = person('ada');
  });
  const open = async () => {
    const calls = serve({ 'GET /session': () => ({ body: { user: signedIn, needsSetUp: false, caughtMail: false } }) });
    renderPage(<RequireSession />, { path: '/projects', at: '/projects' });
    await waitFor(() => expect(screen.queryByText(/Loading/)).toBeNull());
    return calls;
  };

  it('is left where another window of the browser signs in somebody else, and stays where it is the same person', async () => {
    await open();
    otherWindowSays('ada');
    expect(leaveToSomebodyElse).not.toHaveBeenCalled();
    otherWindowSays('bo');
    expect(leaveToSomebodyElse).toHaveBeenCalledTimes(1);
  });

  it('is left where the server says that somebody else is signed in, and shows nothing of before', async () => {
    const calls = await open();
    signedIn = person('bo');
    // as a window that is looked at again asks anew, once what it knows is old
    vi.spyOn(Date, 'now').mockReturnValue(Date.now() + 120_000);
    act(() => { window.dispatchEvent(new Event('visibilitychange')); });
    await waitFor(() => expect(leaveToSomebodyElse).toHaveBeenCalledTimes(1));
    expect(calls.filter(({ path }) => path === '/session')).toHaveLength(2);
    expect(screen.queryByText('Your session has ended')).toBeNull();
    vi.restoreAllMocks();
  });

  it('asks its own person to sign in again where the session is gone', async () => {
    await open();
    signedIn = null;
    vi.spyOn(Date, 'now').mockReturnValue(Date.now() + 120_000);
    act(() => { window.dispatchEvent(new Event('visibilitychange')); });
    expect(await screen.findByText('Your session has ended')).toBeInTheDocument();
    expect(leaveToSomebodyElse).not.toHaveBeenCalled();
    vi.restoreAllMocks();
  });
});
