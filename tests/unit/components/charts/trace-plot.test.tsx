// @vitest-environment jsdom
import { cleanup, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { TracePlot } from '@/components/charts/trace-plot';

// jsdom has no canvas to draw on; what is drawn is looked at in a browser.
vi.mock('@/components/charts/trace-canvas', () => ({ default: () => null }));
afterEach(cleanup);

const whole = { from: 0, to: 6000 };
const level = {
  from: Array.from({ length: 60 }, (_, index) => index * 100),
  minimum: Array.from({ length: 60 }, (_, index) => index),
  maximum: Array.from({ length: 60 }, (_, index) => index + 2),
  mean: Array.from({ length: 60 }, (_, index) => index + 1),
};
const phases = [{ id: 'a', name: 'standby', from: 1000, to: 2000 }];
const plot = { title: 'It rises', level, whole, unit: 'W', zone: null };

describe('TracePlot', () => {
  test('says what is drawn, and gives it in a table of the same numbers', () => {
    render(<TracePlot {...plot} />);
    expect(screen.getByRole('status').textContent).toBe('00:00 to 01:40: 30.5 W on average, between 0 W and 61.0 W.');
    const rows = within(screen.getByRole('table', { hidden: true })).getAllByRole('row', { hidden: true });
    expect(rows).toHaveLength(25);
    expect(Array.from((rows[1] as HTMLTableRowElement).cells, (cell) => cell.textContent)).toEqual([
      '00:00',
      '0',
      // 250 s: 100 of the mean 1, 100 of 2 and 50 of 3.
      '1.80',
      '4.00',
    ]);
  });

  test('moves by buttons alone, and asks for the window when the moving has come to rest', async () => {
    const asked = vi.fn();
    render(<TracePlot {...plot} onWindowChange={asked} />);
    await userEvent.click(screen.getByRole('button', { name: 'Closer' }));
    await userEvent.click(screen.getByRole('button', { name: 'Later' }));
    await waitFor(() => expect(asked).toHaveBeenCalled());
    expect(asked.mock.calls).toEqual([[{ from: 3000, to: 6000 }]]);
    expect(screen.getByRole('status').textContent).toContain('00:50:00 to 01:40:00');
  });

  test('moves by the keyboard', async () => {
    render(<TracePlot {...plot} />);
    screen.getByRole('group', { name: /^Trace/ }).focus();
    await userEvent.keyboard('+{ArrowRight}');
    await waitFor(() => expect(screen.getByRole('status').textContent).toContain('00:30:00 to 01:20:00'));
  });

  test('moves a phase’s edge by a button and by the keyboard', async () => {
    const changed = vi.fn();
    render(<TracePlot {...plot} phases={phases} onPhaseChange={changed} />);
    await userEvent.click(screen.getByRole('button', { name: 'End of standby 2 min later' }));
    expect(changed).toHaveBeenLastCalledWith('a', { from: 1000, to: 2120 });
    screen.getByRole('slider', { name: 'Start of standby' }).focus();
    await userEvent.keyboard('{ArrowLeft}');
    expect(changed).toHaveBeenLastCalledWith('a', { from: 970, to: 2000 });
    // The keys moved the edge and not the window.
    expect(screen.getByRole('status').textContent).toContain('00:00 to 01:40');
  });

  test('shows phases that can’t be changed without anything to move', () => {
    render(<TracePlot {...plot} phases={phases} />);
    expect(screen.queryByRole('slider')).toBeNull();
    expect(within(screen.getByRole('list', { name: 'Phases' })).queryByRole('button')).toBeNull();
  });
});
