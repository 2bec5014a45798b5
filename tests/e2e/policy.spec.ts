import http from 'node:http';
import { expect, test, type Page } from '@playwright/test';

/** Collects what the browser refuses or reports while a page is open. */
function complaintsOf(page: Page): string[] {
  const complaints: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' && /Content Security Policy|hydrat/i.test(message.text())) {
      complaints.push(message.text());
    }
  });
  page.on('pageerror', (error) => complaints.push(error.message));
  return complaints;
}

test('the policy lets each page come alive, first seen and seen again unchanged', async ({ page }) => {
  const complaints = complaintsOf(page);
  for (const address of ['/sign-in', '/sign-up', '/sign-in']) {
    await page.goto(address);
    // Alive: the form says itself what is missing, without asking the server.
    await page.locator('form').getByRole('button').last().click();
    await expect(page.getByRole('alert').first()).toBeVisible();
  }
  expect(complaints).toEqual([]);
});

test('a script that came into a page from elsewhere does not run', async ({ page }) => {
  await page.goto('/sign-in');
  const ran = await page.evaluate(() => {
    const script = document.createElement('script');
    script.textContent = 'window.strange = true';
    document.body.append(script);
    return 'strange' in window;
  });
  expect(ran).toBe(false);
});

test('every answer carries the standing headers, and none tells what serves it', async ({ request }) => {
  for (const address of ['/sign-in', '/no-such-page', '/api/v1/devices', '/icon.svg', '/health']) {
    const headers = (await request.get(address)).headers();
    expect(headers, address).toMatchObject({
      'x-content-type-options': 'nosniff',
      'cross-origin-opener-policy': 'same-origin',
      'referrer-policy': 'strict-origin-when-cross-origin',
    });
    expect(headers['content-security-policy'], address).toContain("object-src 'none'; base-uri 'none'");
    expect(headers['content-security-policy'], address).toContain("frame-ancestors 'none'");
    expect(headers['x-powered-by'], address).toBeUndefined();
    expect(headers['cache-control'] ?? '', address).not.toContain('s-maxage');
  }
});

test('a page takes no other method than reading, and nothing takes TRACE', async ({ request, baseURL }) => {
  for (const method of ['POST', 'PUT', 'DELETE', 'PATCH', 'OPTIONS']) {
    expect((await request.fetch('/sign-in', { method })).status(), method).toBe(405);
  }
  expect((await request.fetch('/api/v1/devices', { method: 'DELETE' })).status()).toBe(405);
  for (const address of ['/sign-in', '/api/v1/devices']) {
    const status = await new Promise((resolve, reject) => {
      const trace = http.request(new URL(address, baseURL), { method: 'TRACE' }, (answer) =>
        resolve(answer.statusCode),
      );
      trace.on('error', reject).end();
    });
    expect(status, address).toBe(405);
  }
});
