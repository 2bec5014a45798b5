import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { Jimp } from 'jimp';
import { beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/lib/platform/database/connection';
import { env } from '@/lib/platform/env';
import { refillBuckets } from '@/lib/platform/rate-limit';
import { getPhotoRoute, uploadPhotoRoute } from '@/lib/reports/handlers/photos';
import { aMember, type MadeMember } from '../../factories/members';
import { aJpeg, anotherPicture, aPng, claimingPng, withMetadata } from '../../factories/pictures';
import { callRoute, formWith } from '../../factories/requests';
import { emptyUploads, filesIn } from '../../factories/uploads-folder';
import { resetDatabase } from '../../setup/database';

let member: MadeMember;

beforeEach(async () => {
  await resetDatabase();
  await emptyUploads();
  refillBuckets();
  member = await aMember();
});

const upload = (file: Uint8Array | string, name = 'photo.jpg') =>
  callRoute(uploadPhotoRoute, { as: member, body: formWith(file, name) });

interface Accepted {
  publicId: string;
  width: number;
  height: number;
  removedMetadata: string[];
  detail: string;
}

const answerOf = (response: Response) => response.json() as Promise<Accepted>;

async function contentOf(publicId: string, size: 'large' | 'small'): Promise<Buffer> {
  const response = await callRoute(getPhotoRoute, { as: member, params: { id: publicId, size } });
  return Buffer.from(await response.arrayBuffer());
}

/** Whether a pixel is mostly red or mostly blue. */
const colourAt = (picture: { getPixelColor: (x: number, y: number) => number }, x: number, y: number) =>
  picture.getPixelColor(x, y) >>> 24 > 128 ? 'red' : 'blue';

describe('a photo', () => {
  it('is kept in two sizes as JPEG, and the original nowhere', async () => {
    const original = await aJpeg(2000, 1000);
    const response = await upload(original);
    expect(response.status).toBe(201);
    const { publicId, width, height } = await answerOf(response);
    expect([width, height]).toEqual([1600, 800]);
    const small = await Jimp.fromBuffer(await contentOf(publicId, 'small'));
    expect([small.width, small.height]).toEqual([480, 240]);
    const kept = await filesIn('kept');
    expect(kept).toHaveLength(2);
    expect(await filesIn('incoming')).toEqual([]);
    for (const name of kept) {
      const content = await readFile(path.join(env().uploadsDirectory, 'kept', name));
      expect(content.equals(original)).toBe(false);
      expect(content.subarray(0, 3)).toEqual(Buffer.from([0xff, 0xd8, 0xff]));
    }
  });

  it('loses place, camera and captions in every size, and says what it lost', async () => {
    const { publicId, removedMetadata } = await answerOf(await upload(withMetadata(await aJpeg(), 1)));
    expect(removedMetadata).toEqual(['camera and date', 'position', 'editing notes', 'captions and keywords']);
    for (const size of ['large', 'small'] as const) {
      const text = (await contentOf(publicId, size)).toString('latin1');
      expect(text).not.toMatch(/SECRET|Exif|xap|Photoshop|8BIM/);
    }
  });

  it.each([
    [1, 'red', 'blue', 60],
    [3, 'blue', 'red', 60],
    [6, 'red', 'red', 40],
    [8, 'blue', 'blue', 40],
  ])('taken with orientation %i stands upright', async (orientation, left, right, width) => {
    const { publicId } = await answerOf(await upload(withMetadata(await aJpeg(60, 40), orientation)));
    const picture = await Jimp.fromBuffer(await contentOf(publicId, 'large'));
    expect(picture.width).toBe(width);
    expect([colourAt(picture, 5, 5), colourAt(picture, picture.width - 5, 5)]).toEqual([left, right]);
  });

  it('that is a PNG becomes a JPEG, and its text is gone', async () => {
    const response = await upload(await aPng(), 'plate.png');
    expect(response.status).toBe(201);
    const content = await contentOf((await answerOf(response)).publicId, 'large');
    expect(content.subarray(0, 3)).toEqual(Buffer.from([0xff, 0xd8, 0xff]));
  });

  it('of 24 megapixels is taken', async () => {
    const response = await upload(await aJpeg(6000, 4000));
    expect([response.status, (await answerOf(response)).width]).toEqual([201, 1600]);
  }, 90_000);
});

const PNG_MAGIC = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
const ftyp = (brand: string) => Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from(`ftyp${brand}\0\0\0\0mif1`)]);

describe('what is no photo', () => {
  it.each<[string, string, () => Uint8Array | Promise<Uint8Array>, number]>([
    [
      'HTML behind a PNG’s first bytes',
      'a.png',
      () => Buffer.concat([PNG_MAGIC, Buffer.from('<script>x</script>')]),
      415,
    ],
    [
      'HTML behind a JPEG’s first bytes',
      'a.jpg',
      () => Buffer.from('\xff\xd8\xff<html><script>x</script>', 'latin1'),
      415,
    ],
    ['an SVG', 'a.svg', () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script/></svg>'), 415],
    ['an SVG called .png', 'a.png', () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'), 415],
    ['a GIF called .png', 'a.png', () => anotherPicture('image/gif'), 415],
    ['a PDF', 'a.pdf', () => Buffer.from('%PDF-1.7\n1 0 obj\n'), 415],
    ['a zip', 'a.zip', () => Buffer.from('PK\x03\x04\x14\0\0\0', 'latin1'), 415],
    ['a BMP', 'a.bmp', () => anotherPicture('image/bmp'), 415],
    ['a TIFF', 'a.tif', () => anotherPicture('image/tiff'), 415],
    ['a WebP', 'a.webp', () => Buffer.from('RIFF\x24\0\0\0WEBPVP8 ', 'latin1'), 415],
    ['an AVIF', 'a.avif', () => ftyp('avif'), 415],
    ['a HEIC', 'a.heic', () => ftyp('heic'), 415],
    ['a JPEG that was cut in half', 'a.jpg', async () => (await aJpeg(800, 600)).subarray(0, 2000), 415],
    ['a JPEG cut in its header', 'a.jpg', async () => (await aJpeg()).subarray(0, 12), 415],
    ['a PNG that was cut', 'a.png', async () => (await aPng(300, 300)).subarray(0, 200), 415],
    ['a PNG of 30,000 × 30,000', 'a.png', () => claimingPng(30_000, 30_000), 413],
    ['a PNG of 10,000 × 10,000', 'a.png', () => claimingPng(10_000, 10_000), 413],
    ['a PNG of no height', 'a.png', () => claimingPng(100, 0), 413],
  ])('%s is refused, with what to do, and nothing of it is kept', async (_what, name, file, status) => {
    const response = await upload(await file(), name);
    const { detail } = await answerOf(response);
    expect([response.status, detail]).toEqual([status, expect.stringMatching(/Save .* choose that file/)]);
    expect([await filesIn('kept'), await filesIn('incoming')]).toEqual([[], []]);
    expect(await database().models.Attachment.count()).toBe(0);
  });

  it('an empty file, and one of 20 MB and more, is refused', async () => {
    expect((await upload('')).status).toBe(400);
    expect((await upload(new Uint8Array(20_000_001).fill(0xff))).status).toBe(413);
    expect(await filesIn('incoming')).toEqual([]);
  });

  it.each(['../../../etc/passwd.jpg', 'CON', `${'x'.repeat(300)}.jpg`, 'a"b\r\nX: y.jpg'])(
    'a file called %j gets a name of ours, inside the folder',
    async (name) => {
      const response = await upload(await aJpeg(), name);
      expect(response.status).toBe(201);
      for (const kept of await filesIn('kept')) expect(kept).toMatch(/^[\w-]{43}\.jpg$/);
      const { publicId } = await answerOf(response);
      const { headers } = await callRoute(getPhotoRoute, { as: member, params: { id: publicId, size: 'small' } });
      expect(headers.get('content-disposition')).toBe(`inline; filename="photo-${publicId}-small.jpg"`);
    },
  );

  it.each(['..', 'a\0b.jpg'])('a part called %j is no file, and nothing of it is kept', async (name) => {
    expect((await upload(await aJpeg(), name)).status).toBe(400);
    expect([await filesIn('kept'), await filesIn('incoming')]).toEqual([[], []]);
  });

  it('beyond a hundred a day is refused', async () => {
    const { publicId } = await answerOf(await upload(await aJpeg()));
    const one = await database().models.Attachment.findOne({ where: { publicId }, rejectOnEmpty: true });
    const { id: _id, ...row } = one.get({ plain: true });
    await database().models.Attachment.bulkCreate(
      Array.from({ length: 99 }, (_, i) => ({
        ...row,
        publicId: `photo${String(i).padStart(5, '0')}`,
        storedLarge: `large ${i}`,
        storedSmall: `small ${i}`,
      })),
    );
    const response = await upload(await aJpeg());
    expect([response.status, (await answerOf(response)).detail]).toEqual([429, expect.stringMatching(/100 photos/)]);
    expect(await filesIn('incoming')).toEqual([]);
  });
});
