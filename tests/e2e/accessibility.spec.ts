import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';

const WIDTHS = [
  { width: 390, height: 844 },
  { width: 1280, height: 900 },
];

async function signIn(page: Page, who: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(`${who}@orrin-skerry.example`);
  await page.getByLabel('Password', { exact: true }).fill(`${who}-keeps-the-lamp-lit`);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Account' })).toBeVisible();
}

/** axe finds nothing, and nothing scrolls sideways but what has a region of its own; at both widths, in both themes. */
async function check(page: Page, ready: () => Promise<void>): Promise<void> {
  for (const size of WIDTHS) {
    for (const colorScheme of ['light', 'dark'] as const) {
      await page.setViewportSize(size);
      await page.emulateMedia({ colorScheme });
      await ready();
      const { violations } = await new AxeBuilder({ page }).analyze();
      const found = violations.map(
        ({ id, nodes }) => `${id}: ${nodes.map((node) => node.target.join(' ')).join(', ')}`,
      );
      expect(found, `${page.url()} ${size.width} ${colorScheme}`).toEqual([]);
      const sideways = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
      expect(sideways, `${page.url()} ${size.width}`).toBeLessThanOrEqual(0);
    }
  }
}

const PAGES: [path: string, heading: string | RegExp][] = [
  ['/', 'What does it really draw?'],
  ['/devices', 'Devices'],
  ['/devices/vennholm-kx-140', 'Vennholm KX-140'],
  ['/categories', 'Categories'],
  ['/categories/chest-freezer', 'Chest freezer'],
  ['/search?q=tidal', '“tidal”'],
  ['/guides', 'Guides'],
  ['/guides/units', 'Watts are already a rate'],
  ['/guides/how-the-figures-are-made', 'How the figures are made'],
  ['/sign-in', 'Sign in'],
  ['/sign-up', 'Make an account'],
  ['/nothing-here', 'Nothing is here'],
];

for (const [path, heading] of PAGES) {
  test(`axe finds nothing on ${path}`, async ({ page }) => {
    await page.goto(path);
    await check(page, () => expect(page.getByRole('heading', { level: 1, name: heading })).toBeVisible());
  });
}

test('axe finds nothing on a report', async ({ page }) => {
  await page.goto('/devices/vennholm-kx-140');
  await page.getByRole('link', { name: 'Ina Tolvers' }).click();
  await check(page, () => expect(page.getByRole('button', { name: 'Closer' }).first()).toBeVisible());
});

test('axe finds nothing in any step of the editor', async ({ page }) => {
  test.setTimeout(120_000);
  await signIn(page, 'ina');
  await page.goto('/reports/new?device=');
  await page.getByLabel('Which device?').fill('tidal');
  await page.getByRole('button', { name: /Corrivane Tidal 4/ }).click();
  for (const step of [
    'Device',
    'Instrument',
    'Method and conditions',
    'Readings',
    'Photos',
    'Notes',
    'Check and send',
  ]) {
    await page.getByRole('button', { name: new RegExp(`\\d\\. ${step}`) }).click();
    await check(page, () => expect(page.getByRole('heading', { level: 2, name: step })).toBeVisible());
  }
});

test('axe finds nothing in the review queue and on the desk', async ({ page }) => {
  await signIn(page, 'nessa');
  await page.goto('/review');
  const first = page.getByRole('table').getByRole('link').first();
  await check(page, () => expect(first).toBeVisible());
  await first.click();
  await check(page, () => expect(page.getByRole('heading', { name: 'Verdict' })).toBeVisible());
});

test('axe finds nothing in the account', async ({ page }) => {
  await signIn(page, 'ina');
  await page.goto('/account');
  await check(page, () => expect(page.getByRole('heading', { name: 'Where I am signed in' })).toBeVisible());
});
