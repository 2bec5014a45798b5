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
      'The picture’s header can’t be read; the file may be cut off. Save it again as JPEG and choose that file.',
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
