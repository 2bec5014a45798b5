import { describe, expect, it } from 'vitest';
import { findMetadata } from '@/lib/platform/pictures/find-metadata';
import { inspectPicture } from '@/lib/platform/pictures/inspect';
import { aJpeg, aPng, claimingPng, withMetadata } from '../../../factories/pictures';

describe('what a picture is', () => {
  it('is told by its first bytes and its header, whatever it is called', async () => {
    expect(inspectPicture(await aJpeg(60, 40))).toEqual({ kind: 'jpeg', width: 60, height: 40 });
    expect(inspectPicture(await aPng(7, 9))).toEqual({ kind: 'png', width: 7, height: 9 });
  });

  it('is taken up to 24 megapixels, and the next line is one too many', () => {
    expect(inspectPicture(claimingPng(6000, 4000)).width).toBe(6000);
    expect(() => inspectPicture(claimingPng(6000, 4001))).toThrow(/6000 × 4001 pixels; 24 megapixels are the most/);
  });

  it.each([new Uint8Array(), new Uint8Array([0xff]), new Uint8Array([0xff, 0xd8, 0xff])])(
    'is nothing where there is next to nothing',
    (content) => expect(() => inspectPicture(content)).toThrow(/JPEG/),
  );
});

describe('what a picture carries besides', () => {
  it('is nothing in one of ours', async () => {
    expect(findMetadata(await aJpeg())).toEqual([]);
    expect(findMetadata(await aPng())).toEqual([]);
  });

  it('is named by its kinds', async () => {
    const found = ['camera and date', 'position', 'editing notes', 'captions and keywords'];
    expect(findMetadata(withMetadata(await aJpeg(), 6))).toEqual(found);
  });

  it('is a position also where only its editing notes say so', async () => {
    const jpeg = await aJpeg();
    const notes = Buffer.from('http://ns.adobe.com/xap/1.0/\0<rdf exif:GPSLatitude="62,1N"/>');
    const content = Buffer.concat([jpeg.subarray(0, 2), notes, jpeg.subarray(2)]);
    expect(findMetadata(content)).toEqual(['position', 'editing notes']);
  });

  it.each([10, 40, 60, 90])('is looked for in %i bytes without reaching beyond them', async (bytes) => {
    expect(() => findMetadata(withMetadata(new Uint8Array(4), 1).subarray(0, bytes))).not.toThrow();
  });
});
