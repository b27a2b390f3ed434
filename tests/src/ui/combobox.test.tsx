// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { Combobox, type ComboboxOption } from '#src/ui/combobox.tsx';

afterEach(cleanup);

const NAMES = ['Glycerin', 'Glyceryl Stearate', 'Glycine Soja Oil'];

function Finder({ onChoose, onSubmit }: { onChoose: (option: ComboboxOption) => void; onSubmit?: () => void }) {
  const [value, setValue] = useState('');
  const options = NAMES.filter((name) => name.toLowerCase().startsWith(value.toLowerCase())).map((name) => ({ id: name, text: name }));
  return (
    <form onSubmit={(event) => { event.preventDefault(); onSubmit?.(); }}>
      <Combobox label="Ingredient" value={value} onType={setValue} options={value === '' ? [] : options} onChoose={(option) => { setValue(option.text); onChoose(option); }} none="Not known" />
      <button type="button">After</button>
    </form>
  );
}

function open(onSubmit?: () => void) {
  const onChoose = vi.fn();
  render(<Finder onChoose={onChoose} onSubmit={onSubmit} />);
  return { onChoose, field: screen.getByRole<HTMLInputElement>('combobox', { name: 'Ingredient' }), user: userEvent.setup() };
}
const pointedAt = (field: HTMLElement) => document.getElementById(field.getAttribute('aria-activedescendant') ?? '')?.textContent;

// Source of the keys: W3C, ARIA Authoring Practices Guide, editable combobox with list.
describe('the keys of a field with a list', () => {
  test('the list opens with the first letter and shuts when the field is emptied', async () => {
    const { field, user } = open();
    expect(field.getAttribute('aria-expanded')).toBe('false');
    await user.type(field, 'g');
    expect(screen.getAllByRole('option').map((option) => option.textContent)).toEqual(NAMES);
    expect(field.getAttribute('aria-expanded')).toBe('true');
    expect(screen.getByRole('listbox', { name: 'Ingredient' }).id).toBe(field.getAttribute('aria-controls'));
    await user.clear(field);
    expect(screen.queryByRole('listbox')).toBeNull();
  });

  test('the arrows walk the options and come round in both directions', async () => {
    const { field, user } = open();
    await user.type(field, 'g{ArrowDown}');
    expect(pointedAt(field)).toBe('Glycerin');
    await user.keyboard('{ArrowUp}');
    expect(pointedAt(field)).toBe('Glycine Soja Oil');
    await user.keyboard('{ArrowDown}{ArrowDown}');
    expect(pointedAt(field)).toBe('Glyceryl Stearate');
    expect(screen.getByRole('option', { selected: true }).textContent).toBe('Glyceryl Stearate');
  });

  test('Enter takes the option that the arrows stand on and shuts the list', async () => {
    const { field, onChoose, user } = open();
    await user.type(field, 'g{ArrowDown}{ArrowDown}{Enter}');
    expect(onChoose).toHaveBeenCalledExactlyOnceWith({ id: 'Glyceryl Stearate', text: 'Glyceryl Stearate' });
    expect(field.value).toBe('Glyceryl Stearate');
    expect(screen.queryByRole('listbox')).toBeNull();
  });

  test('Enter on the text itself keeps the text, takes nothing and sends no form while the list is open', async () => {
    const onSubmit = vi.fn();
    const { field, onChoose, user } = open(onSubmit);
    await user.type(field, 'gly{Enter}');
    expect(onChoose).not.toHaveBeenCalled();
    expect(field.value).toBe('gly');
    expect(onSubmit).not.toHaveBeenCalled();
    await user.keyboard('{Enter}');
    expect(onSubmit).toHaveBeenCalledOnce();
  });

  test('typing on leaves the option that was stood on', async () => {
    const { field, onChoose, user } = open();
    await user.type(field, 'g{ArrowDown}ly{Enter}');
    expect(onChoose).not.toHaveBeenCalled();
  });

  test('Escape shuts the list, leaves the text and does not reach the dialog around it', async () => {
    const outer = vi.fn();
    document.body.addEventListener('keydown', outer);
    const { field, user } = open();
    await user.type(field, 'gly');
    outer.mockClear();
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('listbox')).toBeNull();
    expect(field.value).toBe('gly');
    document.body.removeEventListener('keydown', outer);
    expect(outer).not.toHaveBeenCalled();
  });

  test('Tab takes the option stood on and goes to the next control', async () => {
    const { field, onChoose, user } = open();
    await user.type(field, 'g{ArrowDown}{Tab}');
    expect(onChoose).toHaveBeenCalledOnce();
    expect(document.activeElement?.textContent).toBe('After');
  });

  test('Alt with an arrow opens and shuts the list without walking', async () => {
    const { field, user } = open();
    await user.type(field, 'g{Escape}');
    await user.keyboard('{Alt>}{ArrowDown}{/Alt}');
    expect(screen.getAllByRole('option')).toHaveLength(3);
    expect(field.hasAttribute('aria-activedescendant')).toBe(false);
    await user.keyboard('{Alt>}{ArrowUp}{/Alt}');
    expect(screen.queryByRole('listbox')).toBeNull();
  });
});

describe('the pointer and what is not found', () => {
  test('a press takes the option, and the field keeps the focus', async () => {
    const { field, onChoose, user } = open();
    await user.type(field, 'gly');
    await user.click(screen.getByRole('option', { name: 'Glycine Soja Oil' }));
    expect(onChoose).toHaveBeenCalledExactlyOnceWith({ id: 'Glycine Soja Oil', text: 'Glycine Soja Oil' });
    expect(document.activeElement).toBe(field);
  });

  test('a press elsewhere shuts the list', async () => {
    const { field, user } = open();
    await user.type(field, 'gly');
    await user.click(screen.getByRole('button', { name: 'After' }));
    expect(screen.queryByRole('listbox')).toBeNull();
  });

  test('a word that nothing begins with is said so', async () => {
    const { field, user } = open();
    await user.type(field, 'x');
    expect(screen.getByText('Not known')).toBeTruthy();
    expect(screen.queryByRole('option')).toBeNull();
  });
});
