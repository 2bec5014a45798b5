import { Jimp, loadFont } from 'jimp';
import { SANS_32_BLACK, SANS_64_BLACK } from 'jimp/fonts';

/**
 * A drawing of a socket meter with a reading on its display: plainly a drawing, never mistaken for a photo.
 * @returns a PNG.
 */
export async function drawDisplay(reading: string, below: string): Promise<Buffer> {
  const large = await loadFont(SANS_64_BLACK);
  const small = await loadFont(SANS_32_BLACK);
  const picture = new Jimp({ width: 900, height: 640, color: 0xe9e3d6ff });
  const box = (x: number, y: number, width: number, height: number, color: number) =>
    picture.composite(new Jimp({ width, height, color }), x, y);
  box(210, 60, 480, 520, 0x57534cff);
  box(222, 72, 456, 496, 0xf6f2e8ff);
  box(262, 112, 376, 150, 0x57534cff);
  box(268, 118, 364, 138, 0xc9d6a2ff);
  picture.print({ font: large, x: 292, y: 140, text: reading });
  picture.print({ font: small, x: 262, y: 290, text: below });
  box(390, 400, 120, 120, 0x57534cff);
  box(396, 406, 108, 108, 0xe9e3d6ff);
  box(424, 452, 16, 16, 0x57534cff);
  box(460, 452, 16, 16, 0x57534cff);
  picture.print({ font: small, x: 24, y: 592, text: 'drawn for the demonstration' });
  return picture.getBuffer('image/png');
}
