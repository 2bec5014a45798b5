import { crc32, deflateSync } from 'node:zlib';
import { Jimp } from 'jimp';

/** A picture whose left half is red and right half blue, so that its turning shows. */
export async function aJpeg(width = 60, height = 40): Promise<Uint8Array> {
  return painted(width, height).getBuffer('image/jpeg', { quality: 90 });
}

export async function aPng(width = 60, height = 40): Promise<Uint8Array> {
  return painted(width, height).getBuffer('image/png');
}

/** A whole picture of a kind that is not taken, to be refused for its kind and not for being torn. */
export async function anotherPicture(kind: 'image/gif' | 'image/bmp' | 'image/tiff'): Promise<Uint8Array> {
  return painted(20, 20).getBuffer(kind);
}

function painted(width: number, height: number) {
  const picture = new Jimp({ width, height, color: 0xff0000ff });
  for (let x = Math.floor(width / 2); x < width; x += 1) {
    for (let y = 0; y < height; y += 1) picture.setPixelColor(0x0000ffff, x, y);
  }
  return picture;
}

/** The JPEG with what a phone writes: an Exif block with a camera, an orientation and a position, XMP and IPTC. */
export function withMetadata(jpeg: Uint8Array, orientation: number): Uint8Array {
  const xmp = Buffer.from('http://ns.adobe.com/xap/1.0/\0<x:xmpmeta><rdf:li>SECRET-XMP</rdf:li></x:xmpmeta>', 'latin1');
  const iptc = Buffer.from('Photoshop 3.0\x008BIM\x04\x04\0\0\0\0\0\x0fSECRET-IPTC', 'latin1');
  return Buffer.concat([
    jpeg.subarray(0, 2),
    segment(0xe1, exif(orientation)),
    segment(0xe1, xmp),
    segment(0xed, iptc),
    segment(0xfe, Buffer.from('SECRET-COMMENT')),
    jpeg.subarray(2),
  ]);
}

function segment(marker: number, content: Uint8Array): Buffer {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(content.length + 2, 2);
  return Buffer.concat([head, content]);
}

/** A little-endian Exif block: Make, Orientation, and a GPS directory with a latitude reference. */
function exif(orientation: number): Buffer {
  const tiff = Buffer.alloc(90);
  tiff.write('II', 0, 'latin1');
  tiff.writeUInt16LE(42, 2);
  tiff.writeUInt32LE(8, 4);
  tiff.writeUInt16LE(3, 8);
  entry(tiff, 10, 0x010f, 2, 14, 64);
  entry(tiff, 22, 0x0112, 3, 1, orientation);
  entry(tiff, 34, 0x8825, 4, 1, 50);
  tiff.writeUInt32LE(0, 46);
  tiff.writeUInt16LE(0, 50);
  tiff.write('SECRET-CAMERA\0', 64, 'latin1');
  return Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), tiff]);
}

function entry(tiff: Buffer, at: number, tag: number, type: number, count: number, value: number): void {
  tiff.writeUInt16LE(tag, at);
  tiff.writeUInt16LE(type, at + 2);
  tiff.writeUInt32LE(count, at + 4);
  tiff.writeUInt32LE(value, at + 8);
}

/** A PNG that is small and says that it is large: its header claims what its data doesn't hold. */
export function claimingPng(width: number, height: number): Uint8Array {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(width, 0);
  head.writeUInt32BE(height, 4);
  head.set([8, 2, 0, 0, 0], 8);
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', head),
    chunk('IDAT', deflateSync(Buffer.alloc(64 * 1024))),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

function chunk(kind: string, content: Uint8Array): Buffer {
  const named = Buffer.concat([Buffer.from(kind, 'latin1'), content]);
  const length = Buffer.alloc(4);
  length.writeUInt32BE(content.length);
  const sum = Buffer.alloc(4);
  sum.writeUInt32BE(crc32(named));
  return Buffer.concat([length, named, sum]);
}
