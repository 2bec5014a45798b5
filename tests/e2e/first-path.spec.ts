import { execFileSync } from 'node:child_process';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test, type Page } from '@playwright/test';

const NAME = 'Petra Lindqvist-Abernathy of the Old Harbour Office';
const EMAIL = 'petra@orrin-skerry.example';
const PASSWORD = 'four unrelated words, really';
const DEVICE = '/devices/pellhaven-harbourlink-2';

/** 40,000 rows of an idle router, unevenly spaced, as a logger writes them. */
function unevenLog(): string {
  const rows: string[] = [];
  let time = Date.parse('2026-11-25T06:00:00Z');
  for (let i = 0; i < 40_000; i += 1) {
    time += [1000, 2000, 3000, 5000, 2000][i % 5] as number;
    rows.push(`${new Date(time).toISOString().replace('.000', '')},${(9.6 + ((i * 7) % 11) / 10).toFixed(1)}`);
  }
  return `time,power_W\n${rows.join('\n')}\n`;
}

/** A JPEG whose Exif block names a position: made by the browser, with the block put in behind its start. */
async function photoWithPosition(page: Page): Promise<Buffer> {
  const base64 = await page.evaluate(() => {
    const canvas = document.createElement('canvas');
    canvas.width = 1200;
    canvas.height = 900;
    const brush = canvas.getContext('2d');
    if (brush) {
      brush.fillStyle = 'rgb(200, 210, 160)';
      brush.fillRect(0, 0, 1200, 900);
      brush.fillStyle = 'rgb(30, 30, 30)';
      brush.font = '120px sans-serif';
      brush.fillText('10.1 W', 350, 480);
    }
    return canvas.toDataURL('image/jpeg').split(',')[1] ?? '';
  });
  const jpeg = Buffer.from(base64, 'base64');
  // TIFF, little-endian, one entry: 0x8825, the pointer to a position, at offset 26 with one latitude reference.
  const tiff = Buffer.from([
    ...[0x49, 0x49, 0x2a, 0, 8, 0, 0, 0, 1, 0, 0x25, 0x88, 4, 0, 1, 0, 0, 0, 26, 0, 0, 0, 0, 0, 0, 0],
    ...[1, 0, 1, 0, 2, 0, 2, 0, 0, 0, 0x4e, 0, 0, 0, 0, 0, 0, 0],
  ]);
  const exif = Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), tiff]);
  const length = Buffer.alloc(2);
  length.writeUInt16BE(exif.length + 2);
  return Buffer.concat([jpeg.subarray(0, 2), Buffer.from([0xff, 0xe1]), length, exif, jpeg.subarray(2)]);
}

/** The latest letter to an address, as the catcher kept it. */
function letterTo(address: string): { subject: string; text: string } | undefined {
  const folder = process.env.CAUGHT_MAIL_DIR ?? '';
  return readdirSync(folder)
    .filter((name) => name.endsWith('.json'))
    .sort()
    .map(
      (name) =>
        JSON.parse(readFileSync(path.join(folder, name), 'utf8')) as { to: string; subject: string; text: string },
    )
    .filter((letter) => letter.to === address)
    .at(-1);
}

async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Account' })).toBeVisible();
}

test('from sign-up to a changed published figure', async ({ page, browser }) => {
  test.setTimeout(120_000);

  await test.step('a reader finds one unit behind the figure', async () => {
    await page.goto(DEVICE);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Pellhaven Harbourlink 2');
    await expect(page.getByText('measured on one unit')).toBeVisible();
  });

  await test.step('sign-up refuses a short password and keeps what was typed', async () => {
    await page.goto('/sign-up');
    await page.getByLabel('Name').fill(NAME);
    await page.getByLabel('E-mail address').fill(EMAIL);
    await page.getByLabel('Password', { exact: true }).fill('short');
    await page.getByRole('button', { name: 'Make the account' }).click();
    await expect(page.getByRole('alert', { name: 'There is something to put right' })).toContainText(
      '15 characters or more',
    );
    await expect(page.getByLabel('Name')).toHaveValue(NAME);
    await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await page.getByRole('button', { name: 'Make the account' }).click();
    await expect(page.getByRole('status')).toContainText('A letter is on its way');
  });

  await test.step('the mailed link confirms the address, once', async () => {
    await expect.poll(() => letterTo(EMAIL)?.subject, { timeout: 15_000 }).toBe('Confirm your address');
    const link = /https?:\/\/\S+\/confirm#\S+/.exec(letterTo(EMAIL)?.text ?? '')?.[0] ?? '';
    await page.goto(link);
    await page.getByRole('button', { name: 'Confirm my address' }).click();
    await expect(page.getByText('Your address is confirmed')).toBeVisible();
    await signIn(page, EMAIL, PASSWORD);
  });

  await test.step('device and a new instrument', async () => {
    await page.goto('/reports/new');
    await page.getByLabel('Which device?').fill('harbour link');
    await page.getByRole('button', { name: /Pellhaven Harbourlink 2/ }).click();
    await page.getByRole('button', { name: 'Go on to instrument' }).click();
    await page.getByRole('button', { name: 'Good plug-in meter' }).click();
    await page.getByLabel('Your name for it').fill('Office meter');
    await page.getByRole('button', { name: 'Add this instrument' }).click();
    await expect(page.getByRole('radio', { name: 'Office meter' })).toBeChecked();
    await page.getByRole('button', { name: 'Go on to method and conditions' }).click();
  });

  await test.step('method and conditions; watts per hour are asked about', async () => {
    await page.getByRole('radio', { name: 'Plug-in meter, a whole day' }).check();
    await page.getByLabel('Where was it measured?').selectOption('plug');
    await page.getByRole('radio', { name: 'Yes' }).check();
    await page.getByLabel('Room temperature').fill('20,5');
    await page.getByRole('button', { name: 'Go on to readings' }).click();
    await page.getByRole('button', { name: 'Add a reading' }).click();
    await page.getByLabel('Mean power').fill('10 watts per hour');
    await expect(page.getByText('A watt is a rate already')).toBeVisible();
    await page.getByRole('button', { name: 'Remove reading 1' }).click();
  });

  await test.step('a file without times is refused with a reason; 40,000 uneven rows are read', async () => {
    await page.getByLabel('A logger’s file').setInputFiles({
      name: 'notes.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from('dear diary\nnothing happened today\n'),
    });
    await expect(page.getByText('notes.csv: No line holds a number')).toBeVisible();
    await page.getByLabel('A logger’s file').setInputFiles({
      name: 'router.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from(unevenLog()),
    });
    await expect(page.getByRole('region', { name: 'Trace router.csv' })).toBeVisible({ timeout: 30_000 });
    await expect(page.getByLabel('Mode of phase 1')).toHaveValue('idle');
    await expect(page.getByRole('region', { name: 'Figures so far', exact: true })).toContainText('W', {
      timeout: 15_000,
    });
    await page.getByRole('button', { name: 'Go on to photos' }).click();
  });

  let photoAddress = '';
  await test.step('a photo loses its position, and the member is told', async () => {
    await page.getByLabel('Photos').setInputFiles({
      name: 'display.jpg',
      mimeType: 'image/jpeg',
      buffer: await photoWithPosition(page),
    });
    await expect(page.getByText(/Taken out: .*position/)).toBeVisible({ timeout: 30_000 });
    photoAddress = (await page.getByRole('img', { name: /^Photo 1/ }).getAttribute('src')) ?? '';
    await page.getByLabel('Caption of photo 1').fill('The display at noon');
  });

  await test.step('a reload loses nothing', async () => {
    await expect(page.getByText('saved', { exact: true })).toBeVisible({ timeout: 15_000 });
    await page.reload();
    await expect(page.getByText('Pellhaven Harbourlink 2')).toBeVisible();
    await page.getByRole('button', { name: '7. Check and send' }).click();
    await expect(page.getByText('router.csv (1 phases)')).toBeVisible();
  });

  await test.step('sending without the licence is refused at its box; then it is sent', async () => {
    await page.getByRole('button', { name: 'Send for review' }).click();
    await expect(page.getByRole('alert', { name: 'There is something to put right' })).toContainText(
      'Agree to the licence',
    );
    await page.getByLabel('My readings, text and photos may be published under CC BY 4.0').check();
    await page.getByRole('button', { name: 'Send for review' }).click();
    await expect(page.getByText('waiting for review').first()).toBeVisible({ timeout: 20_000 });
  });
  const reportId = /reports\/([a-z0-9]{10})\//.exec(page.url())?.[1] ?? '';

  await test.step('the report is nobody else’s to read before it is verified', async () => {
    const stranger = await browser.newContext();
    expect((await stranger.request.get(`/api/v1/reports/${reportId}`)).status()).toBe(404);
    expect((await stranger.request.get(photoAddress)).status()).toBe(404);
    await stranger.close();
  });

  await test.step('a moderator verifies it from the queue, with a double click', async () => {
    const desk = await browser.newContext();
    const moderator = await desk.newPage();
    await signIn(moderator, 'nessa@orrin-skerry.example', 'nessa-keeps-the-lamp-lit');
    await moderator.goto('/review');
    await moderator
      .getByRole('row')
      .filter({ hasText: NAME })
      .getByRole('link', { name: 'Pellhaven Harbourlink 2' })
      .click();
    await expect(moderator.getByRole('heading', { name: 'Verdict' })).toBeVisible();
    for (const item of await moderator
      .getByRole('group')
      .filter({ has: moderator.getByRole('radio') })
      .all()) {
      await item.getByRole('radio', { name: 'Passed' }).check();
    }
    await moderator.getByRole('button', { name: 'Verify' }).dblclick();
    await expect(moderator.getByText('The report is verified')).toBeVisible({ timeout: 20_000 });
    await desk.close();
  });

  await test.step('the next reader finds the figure changed, and the photo without its position', async () => {
    await page.goto(DEVICE);
    await expect(page.getByText('two contributors found')).toBeVisible();
    await expect(page.getByRole('link', { name: NAME })).toBeVisible();
    for (const size of ['large', 'small']) {
      const photo = await page.request.get(photoAddress.replace('small', size));
      expect(photo.status()).toBe(200);
      const text = (await photo.body()).toString('latin1');
      expect(text.startsWith('\u00ff\u00d8')).toBe(true);
      expect(text).not.toContain('Exif');
      expect(text).not.toContain('GPS');
    }
    await expect.poll(() => letterTo(EMAIL)?.subject, { timeout: 15_000 }).toContain('verified');
  });

  await test.step('what is published equals a recomputation', () => {
    const output = execFileSync(
      process.execPath,
      ['--conditions=react-server', '--import', 'tsx', 'lib/ops/recompute.ts', '--check'],
      { encoding: 'utf8' },
    );
    expect(output).toMatch(/published figures equal a recomputation/);
  });
});
