import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { roleNames, roles } from '@mantlet/common';
import { renderPage, serve } from '../../test/render.js';
import { termNames, terms } from '../../lib/terms.js';
import HelpPage from './pages/help-page.js';

const session = (administrator: boolean) => ({ 'GET /session': { body: { user: { id: 'u', name: 'Ben', email: 'b@x.test', administrator }, needsSetUp: false } } });
const item = { id: 'p1', number: '1', name: 'House', place: '', roles: ['inspector'], revision: null, members: null, protectedAreaM2: null, open: null, waitsOnMe: 0 };
const open = (answers: Parameters<typeof serve>[0]) => { serve(answers); renderPage(<HelpPage />, { path: '/help', at: '/help' }); };

describe('the help page', () => {
  it('tells every role its part, and explains every word once', async () => {
    open({ ...session(false), 'GET /projects': { body: [] } });
    for (const role of roles) expect(await screen.findByRole('region', { name: roleNames[role] })).toBeInTheDocument();
    for (const name of termNames) expect(screen.getAllByText(terms[name].sentence)).toHaveLength(1);
  });
  it('puts the reader’s own roles first, and leads into their only project', async () => {
    open({ ...session(false), 'GET /projects': { body: [item] } });
    const mine = await screen.findByRole('region', { name: /^Inspector\s+\(you\)$/ });
    expect(screen.getAllByRole('heading', { level: 3 })[0]).toHaveTextContent('Inspector');
    expect(within(mine).getByRole('link', { name: 'Site' })).toHaveAttribute('href', '/projects/p1/site');
    expect(within(screen.getByRole('region', { name: 'Specifier' })).queryByRole('link')).toBeNull();
  });
  it('marks the administrator', async () => {
    open({ ...session(true), 'GET /projects': { body: [] } });
    expect(await screen.findByRole('region', { name: /^Administrator\s+\(you\)$/ })).toBeInTheDocument();
  });
});
