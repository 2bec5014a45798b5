import { findMetadata } from '@/lib/platform/pictures/find-metadata';

const LONGEST_SIDE = 2400;

export interface ShrunkPhoto {
  file: Blob;
  name: string;
  /** What the original carried and this doesn't. */
  removed: string[];
}

/**
 * Draws a picture anew in the browser, smaller and as JPEG: less to send on a slow line, and kinds that the browser
 * can read (WebP, often HEIC) become one that the server takes. Upright as the browser shows it.
 *
 * @throws {Error} with a sentence that says what to do where the browser can't read the picture.
 */
export async function shrinkPhoto(original: File): Promise<ShrunkPhoto> {
  const removed = findMetadata(new Uint8Array(await original.slice(0, 512 * 1024).arrayBuffer()));
  const picture = await createImageBitmap(original, { imageOrientation: 'from-image' }).catch(() => null);
  if (!picture) {
    throw new Error(`${original.name} can’t be read as a picture. Save it as JPEG or PNG and choose that file.`);
  }
  const scale = Math.min(1, LONGEST_SIDE / Math.max(picture.width, picture.height));
  const canvas = document.createElement('canvas');
  canvas.width = Math.max(1, Math.round(picture.width * scale));
  canvas.height = Math.max(1, Math.round(picture.height * scale));
  canvas.getContext('2d')?.drawImage(picture, 0, 0, canvas.width, canvas.height);
  picture.close();
  const file = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/jpeg', 0.86));
  if (!file) throw new Error(`${original.name} is too large for this browser. Save it smaller and choose that file.`);
  return { file, name: original.name.replace(/\.\w+$/, '.jpg'), removed };
}
