const GPS_TAG = 0x8825;
const LONGEST_HEADER = 512 * 1024;

/**
 * Which kinds of metadata a picture carries, so that the member can be told what was taken out: by the server of what
 * came, by the browser of what it wrote anew before sending. Metadata stands at a picture's beginning.
 *
 * @param content the picture's bytes.
 */
export function findMetadata(content: Uint8Array): string[] {
  const head = content.subarray(0, LONGEST_HEADER);
  const text = new TextDecoder('latin1').decode(head);
  const found: string[] = [];
  const jpeg = text.indexOf('Exif\u0000\u0000');
  const png = text.indexOf('eXIf');
  const exifAt = jpeg >= 0 ? jpeg + 6 : png >= 0 ? png + 4 : -1;
  if (exifAt >= 0) found.push('camera and date');
  if ((exifAt >= 0 && namesPosition(head, exifAt)) || text.includes('exif:GPS')) found.push('position');
  if (text.includes('http://ns.adobe.com/xap/') || text.includes('XML:com.adobe.xmp')) found.push('editing notes');
  if (text.includes('Photoshop 3.0')) found.push('captions and keywords');
  if (content[0] === 0x89 && /tEXt|iTXt|zTXt/.test(text)) found.push('text');
  return found;
}

/** Whether the first directory of an Exif block points to a position. */
function namesPosition(head: Uint8Array, start: number): boolean {
  const view = new DataView(head.buffer, head.byteOffset, head.byteLength);
  if (start + 8 > head.byteLength) return false;
  const little = view.getUint16(start) === 0x4949;
  const directory = start + view.getUint32(start + 4, little);
  if (directory + 2 > head.byteLength) return false;
  const entries = view.getUint16(directory, little);
  for (let i = 0, at = directory + 2; i < entries && at + 12 <= head.byteLength; i += 1, at += 12) {
    if (view.getUint16(at, little) === GPS_TAG) return true;
  }
  return false;
}
