import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { renderPage, serve } from '../../../test/render.js';
import SignInPage, { returnAddress } from './sign-in-page.js';

const user = { id: 'u', name: 'Ada', email: 'ada@example.org', administrator: false };

describe('signing in', () => {
  it('returns to the address asked for, and to none outside the application', () => {
    expect(returnAddress('/projects/1/members?open=true')).toBe('/projects/1/members?open=true');
    for (const to of ['https://elsewhere.example', '//elsewhere.example', '/\\elsewhere.example', '/\t/elsewhere.example', '/\n\\elsewhere.example', '/.//elsewhere.example', '/a/..//elsewhere.example', 'javascript:alert(1)', '/a/../sign-in', '/sign-in?to=/x', '', null]) expect(returnAddress(to)).toBe('/projects');
  });
  it('says that address and password do not belong together, and keeps the address', async () => {
    serve({ 'GET /session': { body: { user: null, needsSetUp: false } }, 'POST /session': { status: 401, body: { message: 'The e-mail address and password do not belong together.' } } });
    renderPage(<SignInPage />, { path: '/sign-in', at: '/sign-in' });
    await userEvent.type(await screen.findByLabelText('E-mail'), 'ada@example.org');
    await userEvent.type(screen.getByLabelText('Password'), 'wrong');
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText(/do not belong together/)).toBeInTheDocument();
    expect(screen.getByLabelText('E-mail')).toHaveValue('ada@example.org');
  });
  it('goes on to the page that was asked for', async () => {
    serve({ 'GET /session': { body: { user: null, needsSetUp: false } }, 'POST /session': { body: { user, needsSetUp: false } } });
    const { router } = renderPage(<SignInPage />, { path: '/sign-in', at: '/sign-in?to=%2Fprojects%2F1%2Fsite' });
    await userEvent.type(await screen.findByLabelText('E-mail'), 'ada@example.org');
    await userEvent.type(screen.getByLabelText('Password'), 'right');
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    await screen.findByText('elsewhere');
    expect(router.state.location.pathname).toBe('/projects/1/site');
  });
});
