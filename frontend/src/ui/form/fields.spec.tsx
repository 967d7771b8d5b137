import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { levelInputSchema } from '@mantlet/common';
import { fieldSentence } from './field-frame.js';
import { NumberField, TextField } from './fields.js';
import { useContractForm } from './use-contract-form.js';

function LevelForm({ onSave }: { onSave: (level: unknown) => void }) {
  const form = useContractForm(levelInputSchema, { defaultValues: { code: '', name: '' } });
  return (
    <form onSubmit={(e) => { void form.handleSubmit((body) => onSave(body))(e); }} noValidate>
      <TextField control={form.control} name="code" label="Code" />
      <TextField control={form.control} name="name" label="Name" />
      <NumberField control={form.control} name="elevationM" label="Elevation" unit="m" />
      <NumberField control={form.control} name="heightM" label="Height" unit="m" />
      <button type="submit">Save</button>
    </form>
  );
}

describe('a form resolved by the contract', () => {
  it('says beside each field what is wrong, and saves nothing', async () => {
    const onSave = vi.fn();
    render(<LevelForm onSave={onSave} />);
    await userEvent.type(screen.getByLabelText('Code'), 'L1');
    await userEvent.type(screen.getByLabelText('Height (m)'), '-3');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText('Name is needed.')).toBeInTheDocument();
    expect(screen.getByText('Elevation must be a number.')).toBeInTheDocument();
    expect(screen.getByText('Height must be above 0.')).toBeInTheDocument();
    const height = screen.getByLabelText('Height (m)');
    expect(height).toHaveAttribute('aria-invalid', 'true');
    expect(height).toHaveAccessibleDescription('Height must be above 0.');
    expect(onSave).not.toHaveBeenCalled();
    expect(screen.getByLabelText('Code')).toHaveValue('L1');
  });
  it('gives the parsed value, trimmed and as numbers', async () => {
    const onSave = vi.fn();
    render(<LevelForm onSave={onSave} />);
    await userEvent.type(screen.getByLabelText('Code'), '  L1 ');
    await userEvent.type(screen.getByLabelText('Name'), 'First floor');
    await userEvent.type(screen.getByLabelText('Elevation (m)'), '4.2');
    await userEvent.type(screen.getByLabelText('Height (m)'), '3.6');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    await vi.waitFor(() => expect(onSave).toHaveBeenCalledWith({ code: 'L1', name: 'First floor', elevationM: 4.2, heightM: 3.6 }));
  });
  it('turns a schema\'s words into a sentence', () => {
    expect(fieldSentence('Length', 'must be above 0')).toBe('Length must be above 0.');
    expect(fieldSentence('Reference', 'say where the value comes from')).toBe('Say where the value comes from.');
    expect(fieldSentence('Section', 'Invalid input: expected string, received undefined')).toBe('Section is needed.');
    expect(fieldSentence('γG', 'Too big: expected number to be <=3')).toBe('γG must be at most 3.');
    expect(fieldSentence('Place', 'Too big: expected string to have <=200 characters')).toBe('Place is longer than 200 characters.');
    expect(fieldSentence('Name', 'There already is a level "L1".')).toBe('There already is a level "L1".');
  });
});
