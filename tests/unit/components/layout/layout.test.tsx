// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { Fact, Margin } from '@/components/layout/margin';
import { Sheet } from '@/components/layout/sheet';
import { SiteHeader } from '@/components/layout/site-header';
import { SiteFooter } from '@/components/layout/site-footer';
import { ThemeSwitch } from '@/components/layout/theme-switch';
import { THEME_KEY, THEME_SCRIPT } from '@/lib/platform/theme-script';

afterEach(cleanup);

describe('the header', () => {
  test('searches with a plain form that needs no script', () => {
    render(<SiteHeader account={null} themeKey={THEME_KEY} />);
    const form = screen.getByRole('search');
    expect(form.getAttribute('action')).toBe('/search');
    expect(form.getAttribute('method')).toBe('get');
    expect(
      within(form)
        .getByRole('searchbox', { name: /Search devices/ })
        .getAttribute('name'),
    ).toBe('q');
  });
});

test('the footer says that the demonstration is invented, and only there', () => {
  const { rerender } = render(<SiteFooter demonstration themeKey={THEME_KEY} />);
  expect(screen.queryByText(/invented/)).not.toBeNull();
  rerender(<SiteFooter demonstration={false} themeKey={THEME_KEY} />);
  expect(screen.queryByText(/invented/)).toBeNull();
});

test('a sheet is read as head, facts, body: the order of a phone', () => {
  const { container } = render(
    <Sheet
      head={<h1>Name</h1>}
      margin={
        <Margin>
          <Fact label="Daily energy" figure="0.80 kWh" />
        </Margin>
      }
    >
      Body
    </Sheet>,
  );
  expect(container.textContent).toBe('NameDaily energy0.80 kWhBody');
  expect(screen.getByRole('complementary', { name: 'Facts' })).toBeTruthy();
});

describe('the theme', () => {
  const root = document.documentElement;
  const device = (dark: boolean) => vi.stubGlobal('matchMedia', () => ({ matches: dark }));
  const start = () => new Function(THEME_SCRIPT)();

  beforeEach(() => {
    localStorage.clear();
    delete root.dataset.theme;
  });
  afterEach(() => vi.unstubAllGlobals());

  test('turns to what the device does not say, and is there again before the first paint', async () => {
    device(false);
    render(<ThemeSwitch storageKey={THEME_KEY} />);
    await userEvent.click(screen.getByRole('button'));
    expect(root.dataset.theme).toBe('dark');
    delete root.dataset.theme;
    start();
    expect(root.dataset.theme).toBe('dark');
  });

  test('turned back it follows the device again', async () => {
    device(true);
    render(<ThemeSwitch storageKey={THEME_KEY} />);
    await userEvent.click(screen.getByRole('button'));
    expect(root.dataset.theme).toBe('light');
    await userEvent.click(screen.getByRole('button'));
    expect(root.dataset.theme).toBeUndefined();
    expect(localStorage.getItem(THEME_KEY)).toBeNull();
  });

  test('takes nothing from the store but its two words', () => {
    localStorage.setItem(THEME_KEY, 'x" onload="');
    start();
    expect(root.dataset.theme).toBeUndefined();
  });
});
