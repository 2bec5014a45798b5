// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, test } from 'vitest';
import { DotPlot, type DotPlotProps } from '@/components/charts/dot-plot';

afterEach(cleanup);

const plot: DotPlotProps = {
  title: 'Four households agree within 15 W',
  stones: [
    { id: 'a', value: 86, label: 'Ina Tolvers', flagged: true },
    { id: 'b', value: 71, label: 'M. Askeland' },
    { id: 'c', value: 78, label: 'Orla Fenn' },
    { id: 'd', value: 40, label: 'Pell Marr', setAside: true },
  ],
  median: 78,
  q1: 74.5,
  q3: 82,
  claim: { lower: 60, upper: 75, label: 'maker 60–75 W' },
  unit: 'W',
};

const rowsOf = (table: HTMLElement) =>
  within(table)
    .getAllByRole('row')
    .map((row) => Array.from((row as HTMLTableRowElement).cells, (cell) => cell.textContent));

describe('DotPlot', () => {
  test('has a name, a sentence with its numbers, and the same numbers in a table', () => {
    render(<DotPlot {...plot} />);
    const figure = screen.getByRole('figure', { name: plot.title });
    expect(figure.querySelector('figcaption')?.textContent).toContain(
      '3 contributors: median 78.0 W, range 71.0 to 86.0 W, the middle half between 74.5 and 82.0 W. 1 flagged, 1 set aside. Claim: maker 60–75 W.',
    );
    expect(rowsOf(within(figure).getByRole('table', { hidden: true }))).toEqual([
      ['contributor', 'value', 'remark'],
      ['Pell Marr', '40.0 W', 'set aside'],
      ['M. Askeland', '71.0 W', ''],
      ['Orla Fenn', '78.0 W', ''],
      ['Ina Tolvers', '86.0 W', 'flagged'],
      ['Median', '78.0 W', ''],
      ['Middle half', '74.5–82.0 W', ''],
      ['Claim', 'maker 60–75 W'],
    ]);
  });

  test('each drawing shows one stone for each contributor, a ring for the flagged and a hollow one for the set aside', () => {
    const { container } = render(<DotPlot {...plot} />);
    const drawings = Array.from(container.querySelectorAll('figure svg[role=img]'));
    expect(drawings).toHaveLength(2);
    for (const drawing of drawings) {
      const ids = Array.from(drawing.querySelectorAll<SVGElement>('[data-stone]'), (stone) => stone.dataset.stone);
      expect(ids.sort()).toEqual(['a', 'b', 'c', 'd']);
      expect(drawing.querySelectorAll('.stroke-rust')).toHaveLength(1);
      expect(drawing.querySelector('[data-stone=d]')?.classList).toContain('fill-sheet');
    }
  });

  test('gives the words of the claim and the unit once in each drawing', () => {
    const { container } = render(<DotPlot {...plot} />);
    for (const drawing of container.querySelectorAll('figure svg[role=img]')) {
      const texts = Array.from(drawing.querySelectorAll('text'), (text) => text.textContent);
      expect(texts.filter((text) => text === 'W')).toHaveLength(1);
      expect(texts.filter((text) => text === 'maker 60–75 W')).toHaveLength(1);
    }
  });

  test('of an upper limit says "at most" in its sentence, its table and its key', () => {
    render(<DotPlot {...plot} atMost size="full" />);
    expect(screen.getByRole('figure').querySelector('figcaption')?.textContent).toContain('median at most 78.0 W');
    expect(screen.getByText('Median, at most')).toBeTruthy();
    expect(screen.getByText('median, at most')).toBeTruthy();
  });

  test('in a table cell is one picture with its sentence as name', () => {
    const { container } = render(<DotPlot {...plot} size="cell" />);
    const picture = screen.getByRole('img');
    expect(picture.getAttribute('aria-label')).toContain('median 78.0 W');
    expect([picture.getAttribute('width'), picture.getAttribute('height')]).toEqual(['120', '28']);
    expect(container.querySelector('figure')).toBeNull();
  });

  test('without a stone draws nothing', () => {
    const { container } = render(<DotPlot {...plot} stones={[]} />);
    expect(container.textContent).toBe('');
  });
});

describe('a plot’s keyboard', () => {
  test('is one tab stop; arrows go from stone to stone by value, Home and End to the ends, Escape lets go', async () => {
    render(<DotPlot {...plot} />);
    await userEvent.tab();
    const stop = screen.getByRole('slider', { name: `Stones: ${plot.title}` });
    expect(document.activeElement).toBe(stop);
    const said = () => stop.getAttribute('aria-valuetext');
    await userEvent.keyboard('{ArrowRight}');
    expect(said()).toBe('Pell Marr, 40.0 W, set aside; 1 of 4');
    await userEvent.keyboard('{ArrowRight}{ArrowRight}{ArrowLeft}');
    expect(said()).toBe('M. Askeland, 71.0 W; 2 of 4');
    await userEvent.keyboard('{End}{ArrowRight}');
    expect(said()).toBe('Ina Tolvers, 86.0 W, flagged; 4 of 4');
    await userEvent.keyboard('{Escape}');
    expect(said()).toBe('Arrow keys go from stone to stone');
  });

  test('marks the stone in every drawing, and only that one', async () => {
    const { container } = render(<DotPlot {...plot} />);
    await userEvent.tab();
    await userEvent.keyboard('{Home}{ArrowRight}');
    const marked = Array.from(container.querySelectorAll<SVGElement>('[data-here]'), (mark) => mark.dataset.stone);
    expect(marked).toEqual(['b', 'b']);
  });
});
