// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { ErrorSummary } from '@/components/ui/error-summary';
import { NumberField } from '@/components/ui/inputs';

const errors = [{ field: 'mean', message: 'Write the mean power in watts, such as 43.2' }];

function Form({ shown, attempt = 1 }: { shown: boolean; attempt?: number }) {
  return (
    <>
      <ErrorSummary errors={shown ? errors : []} attempt={attempt} />
      <NumberField name="mean" label="Mean power" unit="W" />
    </>
  );
}

describe('ErrorSummary', () => {
  beforeEach(() => {
    // jsdom draws nothing, so it has nothing to scroll.
    Element.prototype.scrollIntoView = vi.fn();
    vi.stubGlobal('CSS', { escape: (text: string) => text });
    document.title = 'New report';
  });
  afterEach(() => {
    cleanup();
    vi.unstubAllGlobals();
  });

  test('takes the focus when errors appear', () => {
    const { rerender } = render(<Form shown={false} />);
    expect(document.activeElement).toBe(document.body);
    rerender(<Form shown />);
    expect(document.activeElement).toBe(screen.getByRole('alert'));
  });

  test('takes the focus again when the same errors come from another attempt', () => {
    const { rerender } = render(<Form shown />);
    screen.getByLabelText('Mean power').focus();
    rerender(<Form shown attempt={2} />);
    expect(document.activeElement).toBe(screen.getByRole('alert'));
  });

  test('leaves the focus alone while someone types and nothing changed', () => {
    const { rerender } = render(<Form shown />);
    const field = screen.getByLabelText('Mean power');
    field.focus();
    rerender(<Form shown />);
    expect(document.activeElement).toBe(field);
  });

  test('each line leads into its field', async () => {
    render(<Form shown />);
    await userEvent.click(screen.getByRole('link', { name: errors[0]?.message }));
    expect(document.activeElement).toBe(screen.getByLabelText('Mean power'));
  });

  test('puts "Error: " before the title once, and takes it away with the last error', () => {
    const { rerender } = render(<Form shown />);
    rerender(<Form shown attempt={2} />);
    expect(document.title).toBe('Error: New report');
    rerender(<Form shown={false} />);
    expect(document.title).toBe('New report');
  });
});
