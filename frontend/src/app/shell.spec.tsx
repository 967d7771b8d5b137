import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, Link, RouterProvider } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { createQueryClient } from '../lib/query-client.js';
import { serve } from '../test/render.js';
import { PageInfoProvider } from '../ui/page-info.js';
import { Page } from '../ui/page.js';
import { ThemeProvider } from '../ui/theme/theme-provider.js';
import { Shell } from './shell.js';

const first = <Page title="First" heading="The first answer"><Link to="/second">Onward</Link><Link to="/first?filter=a">Filter</Link></Page>;
const second = <Page title="Second" heading="The second answer" />;

function show() {
  serve({ 'GET /session': { body: { user: null, needsSetUp: false } } });
  const router = createMemoryRouter([{ element: <Shell />, children: [{ path: '/first', element: first }, { path: '/second', element: second }] }], { initialEntries: ['/first'] });
  render(<QueryClientProvider client={createQueryClient()}><ThemeProvider><PageInfoProvider><RouterProvider router={router} /></PageInfoProvider></ThemeProvider></QueryClientProvider>);
}

describe('the shell', () => {
  it('moves the focus to the heading of the page one goes to, and names the page', async () => {
    show();
    await userEvent.click(screen.getByRole('link', { name: 'Onward' }));
    expect(screen.getByRole('heading', { name: 'The second answer' })).toHaveFocus();
    expect(document.title).toBe('Second · Mantlet');
  });
  it('leaves the focus where it is when only a filter changes', async () => {
    show();
    await userEvent.click(screen.getByRole('link', { name: 'Filter' }));
    expect(screen.getByRole('link', { name: 'Filter' })).toHaveFocus();
  });
  it('leads past the strip and the list of pages by the first Tab', async () => {
    show();
    await userEvent.tab();
    expect(screen.getByRole('link', { name: 'Skip to the page' })).toHaveFocus();
    await userEvent.keyboard('{Enter}');
    expect(screen.getByRole('main')).toHaveFocus();
  });
});
