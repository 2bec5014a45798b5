import { setTimeout as wait } from 'node:timers/promises';
import { beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/lib/platform/database/connection';
import { refillBuckets } from '@/lib/platform/rate-limit';
import { readTraceAgainRoute, uploadTraceRoute } from '@/lib/reports/handlers/traces';
import { aMember, type MadeMember } from '../../factories/members';
import { aLog } from '../../factories/reports';
import { callRoute, formWith } from '../../factories/requests';
import { emptyUploads, filesIn, openUploads } from '../../factories/uploads-folder';
import { resetDatabase } from '../../setup/database';

let member: MadeMember;

beforeEach(async () => {
  await resetDatabase();
  await emptyUploads();
  refillBuckets();
  member = await aMember();
});

const steady = aLog(1200, (second) => 40 + (second % 7) / 10);

/** Every tenth of its rows has no time. */
const tornLog = () =>
  steady
    .split('\n')
    .slice(1, -1)
    .map((row, i) => (i % 10 === 9 ? 'xx,40' : row))
    .join('\n');

function upload(file: string | Uint8Array, name = 'log.csv', fields: Record<string, string> = {}) {
  return callRoute(uploadTraceRoute, { as: member, body: formWith(file, name, fields) });
}

interface Answer {
  status: string;
  uploadPublicId: string;
  tracePublicId: string;
  description: { questions: { key: string }[] };
  detail: string;
  errors: { pointer: string; message: string }[];
  facts: Record<string, unknown>;
}

const answerOf = (response: Response) => response.json() as Promise<Answer>;

describe('a logger’s file', () => {
  it('is kept as it came, read, and its series kept beside it', async () => {
    const response = await upload(steady, 'logs/küche 1.csv');
    expect(response.status).toBe(200);
    const { status, tracePublicId } = await answerOf(response);
    expect(status).toBe('read');
    const trace = await database().models.Trace.findOne({ where: { publicId: tracePublicId }, rejectOnEmpty: true });
    expect(trace).toMatchObject({ fileName: 'küche 1.csv', samples: 121, kind: 'samples', powerKind: 'real' });
    expect(trace.fileBytes).toBe(Buffer.byteLength(steady));
    const kept = await filesIn('kept');
    expect(kept).toEqual(expect.arrayContaining([trace.storedFile, trace.storedSeries]));
    expect(await filesIn('incoming')).toEqual([]);
  });

  it('is asked about where it leaves something open, and read with the answer without being sent again', async () => {
    const twoDays = '03/04/2026 10:00;40\n03/04/2026 10:10;41\n03/04/2026 10:20;40\n';
    const asked = await answerOf(await upload(`time;power W\n${twoDays}`));
    expect(asked.status).toBe('needs-answers');
    expect(asked.description.questions.map((question) => question.key)).toContain('timeFormat');
    const again = await callRoute(readTraceAgainRoute, {
      as: member,
      params: { id: asked.uploadPublicId },
      body: { zone: 'UTC', corrections: { timeFormat: 'day-first' } },
    });
    const read = await answerOf(again);
    expect(read.status).toBe('read');
    const trace = await database().models.Trace.findOne({ where: { publicId: read.tracePublicId } });
    expect(trace?.startsAt.toISOString()).toBe('2026-04-03T10:00:00.000Z');
  });

  it('read again with the same corrections is the same trace, with others another', async () => {
    const { uploadPublicId, tracePublicId } = await answerOf(await upload(steady));
    const again = async (corrections: object) =>
      (
        await answerOf(
          await callRoute(readTraceAgainRoute, {
            as: member,
            params: { id: uploadPublicId },
            body: { zone: 'UTC', corrections },
          }),
        )
      ).tracePublicId;
    expect(await again({})).toBe(tracePublicId);
    const turned = await again({ turnSign: true });
    expect(turned).not.toBe(tracePublicId);
    expect(await again({ turnSign: true })).toBe(turned);
    expect(await database().models.Trace.count()).toBe(2);
  });

  it('keeps no more than a dozen readings, and their files no longer than they', async () => {
    const { uploadPublicId } = await answerOf(await upload(steady));
    for (let volts = 1; volts <= 15; volts += 1) {
      await callRoute(readTraceAgainRoute, {
        as: member,
        params: { id: uploadPublicId },
        body: { zone: 'UTC', corrections: { averagingSeconds: volts } },
      });
    }
    const rows = await database().models.Trace.findAll();
    expect(rows).toHaveLength(12);
    const kept = await filesIn('kept');
    expect(rows.every((row) => kept.includes(row.storedSeries))).toBe(true);
    expect(kept.filter((name) => name.endsWith('.series'))).toHaveLength(12);
  });

  it('is somebody else’s business only where it is theirs', async () => {
    const { uploadPublicId } = await answerOf(await upload(steady));
    const params = { id: uploadPublicId };
    const body = { zone: 'UTC', corrections: {} };
    expect((await callRoute(readTraceAgainRoute, { as: await aMember(), params, body })).status).toBe(404);
    expect((await callRoute(readTraceAgainRoute, { params, body })).status).toBe(401);
    expect((await callRoute(uploadTraceRoute, { body: formWith(steady, 'a.csv') })).status).toBe(401);
  });

  it.each([
    ['empty', '', 400, /empty/],
    ['of blank lines', '\n\n\n', 422, /readings|holds|line/i],
    ['without a time column', 'volts,power_W\n230,40\n231,41\n229,40\n', 422, /No column holds times/],
    ['of the logger’s own kind', new Uint8Array([0x50, 0x4b, 3, 4, 0, 0, 0, 9, 0, 255, 10, 0, 0]), 422, /CSV/],
    ['of one endless line', `time,power_W\n${'9'.repeat(50_000)}`, 422, /longer than/],
    ['cut off after its header', 'time,power_W\n', 422, /readings|holds|rows/i],
    ['of times that no calendar has', 'time,power_W\n1e30,4\n2e30,5\n3e30,6\n', 422, /./],
    ['of readings that no number holds', 'epoch,power_W\n1790000000,1e300\n1790000010,1e301\n', 422, /too large/],
    ['in which most rows are torn', `time,power_W\n${'2026-11-02T00:0,4\n'.repeat(40)}`, 422, /No line holds a number/],
    ['in which one row in ten is torn', `time,power_W\n${tornLog()}`, 422, /the first in line 11: .*Lines: 11, 21/],
  ])('%s is refused with what to do, and not kept', async (_what, file, status, words) => {
    const before = await filesIn('kept');
    const response = await upload(file);
    const { detail } = await answerOf(response);
    expect([response.status, detail]).toEqual([status, expect.stringMatching(words)]);
    expect(await filesIn('kept')).toEqual(before);
    expect(await filesIn('incoming')).toEqual([]);
    expect(await database().models.TraceUpload.count()).toBe(0);
  });

  it.each([
    ['a zone that is none', { zone: 'Orrin/Skerry' }, '/zone'],
    ['corrections that are no JSON', { corrections: '{' }, '/corrections'],
    ['a correction that is none', { corrections: '{"volts":"many"}' }, '/corrections/volts'],
    ['a correction of another name', { corrections: '{"__proto__":1,"role":"admin"}' }, '/corrections'],
  ])('with %s is refused at that field, and not kept', async (_what, fields, pointer) => {
    const response = await upload(steady, 'log.csv', fields);
    expect(response.status).toBe(422);
    expect((await answerOf(response)).errors.map((error) => error.pointer)).toContain(pointer);
    expect(await filesIn('incoming')).toEqual([]);
  });

  it('beyond the day’s quota is refused, and told what is left', async () => {
    await upload(steady);
    await database().models.TraceUpload.update({ fileBytes: 599_999_000 }, { where: {} });
    const response = await upload(steady);
    expect(response.status).toBe(429);
    const { detail, facts } = await answerOf(response);
    expect(detail).toMatch(/600 MB .* 0 MB are left/);
    expect(facts).toEqual({ bytesLeft: 1000 });
    expect(await filesIn('incoming')).toEqual([]);
  });
});

describe('receiving', () => {
  it.each([
    ['JSON', { 'content-type': 'application/json' }, '{}', 415],
    ['a form without files', { 'content-type': 'application/x-www-form-urlencoded' }, 'file=1', 415],
    ['multipart without a boundary', { 'content-type': 'multipart/form-data' }, 'x', 400],
    ['multipart that ends early', { 'content-type': 'multipart/form-data; boundary=b' }, '--b\r\nContent-Dispo', 400],
  ])('refuses %s', async (_what, headers, text, status) => {
    const body = new Response(text).body as ReadableStream;
    const response = await callRoute(uploadTraceRoute, { as: member, body, headers });
    expect(response.status).toBe(status);
    expect(await filesIn('incoming')).toEqual([]);
  });

  it('refuses two files, a file in another field, and deep or many field names', async () => {
    const two = formWith(steady, 'a.csv');
    two.append('file', new Blob(['x']), 'b.csv');
    const other = new FormData();
    other.append('photo', new Blob(['x']), 'b.csv');
    const deep = formWith(steady, 'a.csv', { 'a[b][c]': '1' });
    const long = formWith(steady, 'a.csv', { corrections: ' '.repeat(30_000) });
    const many = new FormData();
    for (let i = 0; i < 40; i += 1) many.append(`field${i}`, '1');
    for (const body of [two, other, deep, long, many]) {
      expect((await callRoute(uploadTraceRoute, { as: member, body })).status).toBe(400);
    }
    await wait(50);
    expect(await filesIn('incoming')).toEqual([]);
  });

  it('refuses a file one byte over the limit, and one that says so before it travels', async () => {
    const row = '2026-11-02T00:00:00Z,40\n';
    const head = '--b\r\nContent-Disposition: form-data; name="file"; filename="a.csv"\r\n\r\n';
    const chunk = new TextEncoder().encode(row.repeat(40_000));
    let left = 64_000_001;
    const body = new ReadableStream<Uint8Array>({
      start: (controller) => controller.enqueue(new TextEncoder().encode(head)),
      pull: (controller) => {
        if (left > 0) controller.enqueue(chunk.subarray(0, Math.min(chunk.length, left)));
        else {
          controller.enqueue(new TextEncoder().encode('\r\n--b--\r\n'));
          controller.close();
        }
        left -= chunk.length;
      },
    });
    const headers = { 'content-type': 'multipart/form-data; boundary=b' };
    const streamed = await callRoute(uploadTraceRoute, { as: member, body, headers });
    expect([streamed.status, (await answerOf(streamed)).detail]).toEqual([413, expect.stringMatching(/64 MB/)]);
    const announced = await callRoute(uploadTraceRoute, {
      as: member,
      body: new Response('--b').body as ReadableStream,
      headers: { ...headers, 'content-length': '900000000' },
    });
    expect(announced.status).toBe(413);
    expect(await filesIn('incoming')).toEqual([]);
  });

  it('leaves no file and no open descriptor of two hundred uploads that were cut off', async () => {
    const head = '--b\r\nContent-Disposition: form-data; name="file"; filename="a.csv"\r\n\r\n';
    const cut = async (after: number) => {
      const body = new ReadableStream<Uint8Array>({
        start: (controller) => {
          controller.enqueue(new TextEncoder().encode(head + 'x'.repeat(after)));
          setTimeout(() => controller.error(new Error('the line was cut')), after % 5);
        },
      });
      const headers = { 'content-type': 'multipart/form-data; boundary=b' };
      return (await callRoute(uploadTraceRoute, { as: member, body, headers })).status;
    };
    for (let round = 0; round < 20; round += 1) {
      refillBuckets();
      const statuses = await Promise.all(Array.from({ length: 10 }, (_, i) => cut(round * 5000 + i * 777)));
      expect(new Set(statuses)).toEqual(new Set([400]));
    }
    await wait(100);
    expect(await filesIn('incoming')).toEqual([]);
    expect(await openUploads()).toEqual([]);
  });
});
