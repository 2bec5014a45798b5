import { readFileSync, writeFileSync } from 'node:fs';
import { Jimp } from 'jimp';

/**
 * Writes a picture anew in two sizes, upright and without metadata. A process of its own under limits: a decoder meets
 * what strangers send. Arguments: the picture, where the large and where the small one go. Prints their sizes.
 */
const [input, largePath, smallPath] = process.argv.slice(2);
const QUALITY = 82;

// fromBuffer, never read: read opens paths and addresses that a text names.
const picture = await Jimp.fromBuffer(readFileSync(input));
const sizes = {};
for (const [name, most, file] of [
  ['large', 1600, largePath],
  ['small', 480, smallPath],
]) {
  if (picture.width > most || picture.height > most) picture.scaleToFit({ w: most, h: most });
  const flat = new Jimp({ width: picture.width, height: picture.height, color: 0xffffffff });
  flat.composite(picture, 0, 0);
  const bytes = await flat.getBuffer('image/jpeg', { quality: QUALITY });
  writeFileSync(file, bytes);
  sizes[name] = { width: flat.width, height: flat.height, bytes: bytes.length };
}
process.stdout.write(JSON.stringify(sizes));
