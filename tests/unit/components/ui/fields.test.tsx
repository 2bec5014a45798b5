// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { Button } from '@/components/ui/button';
import { RadioGroup } from '@/components/ui/choices';
import { FileDrop } from '@/components/ui/file-drop';
import { NumberField, TextInput } from '@/components/ui/inputs';

afterEach(cleanup);

/** The words that are read after a control's name, in their order. */
function description(control: HTMLElement): (string | null | undefined)[] {
  const ids = control.getAttribute('aria-describedby')?.split(' ') ?? [];
  return ids.map((id) => document.getElementById(id)?.textContent);
}

describe('a field', () => {
  test('is named by its label alone and described by hint, error and unit in this order', () => {
    render(<NumberField name="mean" label="Mean power" hint="From the meter" error="Write a number" unit="W" />);
    const control = screen.getByLabelText('Mean power');
    expect(description(control)).toEqual(['From the meter', 'Error: Write a number', 'W']);
    expect(control.getAttribute('aria-invalid')).toBe('true');
  });

  test('without hint and error it names no description and is not marked as wrong', () => {
    render(<TextInput name="title" label="Name" />);
    const control = screen.getByLabelText('Name');
    expect(control.hasAttribute('aria-describedby')).toBe(false);
    expect(control.hasAttribute('aria-invalid')).toBe(false);
  });

  test('keeps what was typed when an error appears', async () => {
    const { rerender } = render(<TextInput name="title" label="Name" />);
    await userEvent.type(screen.getByLabelText('Name'), 'KX');
    rerender(<TextInput name="title" label="Name" error="Write the whole name" />);
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('KX');
  });
});

test('an error summary finds the first answer of a group of radio buttons under the group’s name', () => {
  const options = [
    { value: 'ac', label: 'Mains' },
    { value: 'dc', label: 'DC' },
  ];
  render(<RadioGroup name="supply" label="Which supply?" options={options} error="Choose one" />);
  expect(document.getElementById('supply')).toBe(screen.getByLabelText('Mains'));
  expect(description(screen.getByRole('group', { name: 'Which supply?' }))).toEqual(['Error: Choose one']);
});

test('a busy button keeps the focus, takes no second press and sends no form', async () => {
  const press = vi.fn();
  const send = vi.fn((event: Event) => event.preventDefault());
  const { container } = render(
    <form>
      <Button type="submit" busy onClick={press}>
        Send
      </Button>
    </form>,
  );
  container.addEventListener('submit', send);
  const button = screen.getByRole('button', { name: 'Send' });
  await userEvent.click(button);
  expect(document.activeElement).toBe(button);
  expect(press).not.toHaveBeenCalled();
  expect(send).not.toHaveBeenCalled();
});

test('the same file can be chosen twice in a row, as after a failed upload', async () => {
  const take = vi.fn();
  render(<FileDrop name="trace" label="Trace" hint="CSV up to 20 MB" onFiles={take} />);
  const file = new File(['t,W\n0,1\n'], 'garage.csv');
  await userEvent.upload(screen.getByLabelText('Trace'), file);
  await userEvent.upload(screen.getByLabelText('Trace'), file);
  expect(take.mock.calls).toEqual([[[file]], [[file]]]);
});
