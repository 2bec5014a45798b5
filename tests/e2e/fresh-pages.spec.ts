import { expect, test, type APIRequestContext } from '@playwright/test';

const DEVICE = '/devices/vennholm-kx-140';
const CATEGORY = '/categories/chest-freezer';

async function signInAs(request: APIRequestContext, origin: string, name: string): Promise<void> {
  const { csrfToken } = (await (await request.get('/api/auth/csrf')).json()) as { csrfToken: string };
  const answer = await request.post('/api/auth/callback/credentials', {
    headers: { origin },
    form: { csrfToken, email: `${name}@orrin-skerry.example`, password: `${name}-keeps-the-lamp-lit`, json: 'true' },
  });
  expect(answer.ok()).toBe(true);
}

interface Queue {
  items: { publicId: string; revision: number; device: { name: string } }[];
}

interface Desk {
  report: { method: { checklist: { key: string }[] } };
}

const contributors = (html: string) => /(\w+) contributors found/.exec(html.replace(/<[^>]*>/g, ''))?.[1];

test('what a verification publishes stands in every page and payload as soon as it is answered', async ({
  playwright,
  request,
  baseURL,
}) => {
  const origin = baseURL ?? '';
  // Kept before the verification, as a busy page always is.
  const before = await (await request.get(DEVICE)).text();
  expect((await request.get(DEVICE)).headers()['x-nextjs-cache']).toBe('HIT');
  await request.get(CATEGORY);
  expect(contributors(before)).toBe('nine');

  const moderator = await playwright.request.newContext({ baseURL: origin });
  await signInAs(moderator, origin, 'nessa');
  const { items } = (await (await moderator.get('/api/v1/review/queue')).json()) as Queue;
  const waiting = items.find((item) => item.device.name === 'Vennholm KX-140');
  if (!waiting) throw new Error('The demonstration has no report of this device to be verified.');
  const desk = (await (await moderator.get(`/api/v1/review/reports/${waiting.publicId}`)).json()) as Desk;
  const checklist = desk.report.method.checklist.map(({ key }) => ({ key, result: 'passed', remark: '' }));
  const verdict = await moderator.post(`/api/v1/review/reports/${waiting.publicId}/verdict`, {
    headers: { origin },
    data: { revision: waiting.revision, verdict: 'verified', checklist, reason: '', remarks: [] },
  });
  expect(verdict.status(), await verdict.text()).toBe(200);

  const [page, payload, report] = await Promise.all([
    request.get(DEVICE).then((answer) => answer.text()),
    request.get(DEVICE, { headers: { rsc: '1' } }).then((answer) => answer.text()),
    request.get(`/reports/${waiting.publicId}`),
  ]);
  expect(contributors(page)).toBe('ten');
  expect(payload).toContain('ten contributors');
  expect(report.status()).toBe(200);
  await moderator.dispose();
});

test('an address that leads nowhere is looked up afresh each time', async ({ request }) => {
  const missing = await request.get('/devices/no-such-device');
  expect(missing.status()).toBe(404);
  expect((await request.get('/devices/no-such-device')).headers()['x-nextjs-cache']).not.toBe('HIT');
});
