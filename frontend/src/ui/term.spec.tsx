import { fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { terms } from '../lib/terms.js';
import { FieldFrame } from './form/field-frame.js';
import { ScheduleTable } from './schedule-table.js';
import { Term } from './term.js';

const sentence = terms['section-factor'].sentence;
const word = (name = 'A/V') => screen.getByText(name);

describe('a term', () => {
  it('is described by its sentence before anything is opened', () => {
    render(<Term name="section-factor">A/V</Term>);
    expect(word()).toHaveAccessibleDescription(sentence);
    expect(word()).toHaveAttribute('tabindex', '0');
    expect(screen.queryByRole('tooltip')).toBeNull();
  });
  it('opens on focus, closes with Escape, and opens again by key', async () => {
    render(<Term name="section-factor">A/V</Term>);
    fireEvent.focus(word());
    expect(await screen.findByRole('tooltip')).toHaveTextContent(sentence);
    // still said once only
    expect(word()).toHaveAccessibleDescription(sentence);
    fireEvent.keyDown(word(), { key: 'Escape' });
    await waitFor(() => expect(screen.queryByRole('tooltip')).toBeNull());
    fireEvent.keyDown(word(), { key: 'Enter' });
    expect(await screen.findByRole('tooltip')).toHaveTextContent(sentence);
  });
  it('leaves the name of a field as it is, and a tap on it stays on the word', async () => {
    const tapped = vi.fn();
    render(<FieldFrame id="f" label="Period" unit="min" term="period" error={undefined}><input id="f" onClick={tapped} /></FieldFrame>);
    expect(screen.getByLabelText('Period (min)')).toHaveAttribute('id', 'f');
    fireEvent.click(word('Period'));
    expect(await screen.findByRole('tooltip')).toHaveTextContent(terms.period.sentence);
    expect(tapped).not.toHaveBeenCalled();
  });
  it('leaves the name of a column and of its cells as they are', () => {
    render(<ScheduleTable caption="t" rowKey={(r) => r.a} rows={[{ a: '1' }]} columns={[{ title: 'Section factor', term: 'section-factor', key: 'a', render: (_, r) => r.a }]} />);
    expect(screen.getByRole('columnheader', { name: 'Section factor' })).toBeInTheDocument();
    expect(screen.getByRole('cell')).toHaveAttribute('data-label', 'Section factor');
    expect(within(screen.getByRole('columnheader')).getByText('Section factor')).toHaveAccessibleDescription(sentence);
  });
});
