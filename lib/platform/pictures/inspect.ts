import 'server-only';
import { imageSize } from 'image-size';
import { AppError } from '../errors';

const MOST_PIXELS = 24_000_000;

export interface PictureFacts {
  kind: 'jpeg' | 'png';
  width: number;
  height: number;
}

/**
 * What a picture is, by its first bytes and its header alone: nothing is decoded yet, since a small file may claim
 * pixels that would fill the machine's memory.
 *
 * @throws {AppError} unsupported-kind or too-large, saying what to do.
 */
export function inspectPicture(content: Uint8Array): PictureFacts {
  const kind = magicOf(content);
  if (!kind) {
    throw new AppError(
      'unsupported-kind',
      'This is neither a JPEG nor a PNG. Save the picture as JPEG and choose that file.',
    );
  }
  let size: { width: number; height: number };
  try {
    size = imageSize(content);
  } catch {
    throw new AppError(
      'unsupported-kind',
      'The picture’s header can’t be read; the file may be cut off. Save it again as JPEG.',
    );
  }
  if (size.width * size.height > MOST_PIXELS || size.width < 1 || size.height < 1) {
    throw new AppError(
      'too-large',
      `The picture says it has ${size.width} × ${size.height} pixels; 24 megapixels are the most. Save it smaller and choose that file.`,
    );
  }
  return { kind, width: size.width, height: size.height };
}

function magicOf(content: Uint8Array): 'jpeg' | 'png' | null {
  const starts = (...bytes: number[]) => bytes.every((byte, i) => content[i] === byte);
  if (starts(0xff, 0xd8, 0xff)) return 'jpeg';
  return starts(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a) ? 'png' : null;
}

/** Which kinds of metadata a picture carries, so that the member can be told what was taken out. */
export function findMetadata(content: Uint8Array): string[] {
  const text = Buffer.from(content.buffer, content.byteOffset, content.byteLength).toString('latin1');
  const found: string[] = [];
  const exif = text.includes('Exif\u0000\u0000') || text.includes('eXIf');
  if (exif) found.push('camera and date');
  if (exif && hasGpsPointer(content)) found.push('position');
  if (text.includes('http://ns.adobe.com/xap/') || text.includes('XML:com.adobe.xmp')) found.push('editing notes');
  if (text.includes('Photoshop 3.0')) found.push('captions and keywords');
  if (/tEXt|iTXt|zTXt/.test(text) && text.startsWith('\u0089PNG')) found.push('text');
  return found;
}

/** The tag 0x8825 in the first directory of the Exif block says where a position stands. */
function hasGpsPointer(content: Uint8Array): boolean {
  const buffer = Buffer.from(content.buffer, content.byteOffset, content.byteLength);
  const jpeg = buffer.indexOf('Exif\u0000\u0000', 0, 'latin1');
  const png = buffer.indexOf('eXIf', 0, 'latin1');
  const start = jpeg >= 0 ? jpeg + 6 : png + 4;
  if (start + 8 > buffer.length) return false;
  const little = buffer.toString('latin1', start, start + 2) === 'II';
  const u16 = (at: number) => (little ? buffer.readUInt16LE(at) : buffer.readUInt16BE(at));
  const u32 = (at: number) => (little ? buffer.readUInt32LE(at) : buffer.readUInt32BE(at));
  const directory = start + u32(start + 4);
  if (directory + 2 > buffer.length) return false;
  const entries = Math.min(u16(directory), 500);
  for (let i = 0; i < entries; i += 1) {
    const at = directory + 2 + 12 * i;
    if (at + 2 > buffer.length) return false;
    if (u16(at) === 0x8825) return true;
  }
  return false;
}
