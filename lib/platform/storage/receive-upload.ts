import 'server-only';
import type { IncomingMessage, ServerResponse } from 'node:http';
import { Readable, Writable } from 'node:stream';
import multer, { MulterError } from 'multer';
import { AppError } from '../errors';
import { dropFile, incomingFolder, storedName } from './files';

/** Boundaries, part headers and fields of a multipart body. */
const MOST_FRAME = 300_000;

/** A file that has been received, and the fields that came with it. */
export interface ReceivedUpload {
  path: string;
  /** As the member called it, for showing alone. */
  name: string;
  bytes: number;
  fields: Record<string, string>;
}

/**
 * Streams one file of a multipart body to disk, flushed, with every limit set (multer's are infinite otherwise). A cut
 * or refused upload leaves nothing behind.
 *
 * @throws {AppError} unsupported-kind, too-large, bad-request: each says what to do.
 */
export async function receiveUpload(request: Request, mostBytes: number): Promise<ReceivedUpload> {
  if (!request.headers.get('content-type')?.toLowerCase().startsWith('multipart/form-data')) {
    throw new AppError('unsupported-kind', 'Send the file as multipart/form-data, in the field “file”.');
  }
  if (!request.body) throw new AppError('bad-request', 'No file came. Choose one and send it again.');
  // What says that it is too large need not travel first; the rest of a body is the file's frame.
  const announced = Number(request.headers.get('content-length') ?? 0);
  if (announced > mostBytes + MOST_FRAME) throw tooLarge(mostBytes);
  const parser = fileParser(await incomingFolder(), mostBytes);
  // Nothing is awaited from here until the parser listens: what fails in between would never be heard of.
  const incoming = asIncoming(request);
  // multer removes what it has written of a stream that ends early, and reports only then.
  const cutOff = () => incoming.destroy(new Error('cut off'));
  request.signal.addEventListener('abort', cutOff, { once: true });
  try {
    await new Promise<void>((resolve, reject) => {
      if (request.signal.aborted) cutOff();
      parser(incoming as never, new Writable() as unknown as ServerResponse as never, (error: unknown) =>
        error ? reject(asProblem(error, mostBytes)) : resolve(),
      );
    });
  } finally {
    request.signal.removeEventListener('abort', cutOff);
  }
  const { file } = incoming;
  if (!file) throw new AppError('bad-request', 'No file came in the field “file”. Choose one and send it again.');
  if (file.size === 0) {
    await dropFile(file.path);
    throw new AppError('bad-request', 'The file is empty. Export or save it again, and choose that one.');
  }
  return {
    path: file.path,
    name: readableName(file.originalname),
    bytes: file.size,
    fields: Object.fromEntries(
      Object.entries(incoming.body ?? {}).filter((entry): entry is [string, string] => typeof entry[1] === 'string'),
    ),
  };
}

function fileParser(folder: string, mostBytes: number) {
  return multer({
    storage: multer.diskStorage({
      destination: folder,
      filename: (_request, _file, done) => done(null, storedName('part')),
      // The file must be on the disk before a row names it.
      flush: true,
    } as multer.DiskStorageOptions),
    // Browsers write names as UTF-8; the parser's own default is Latin-1.
    defParamCharset: 'utf8',
    limits: {
      fieldNameSize: 60,
      fieldSize: 20_000,
      fields: 10,
      fieldNestingDepth: 0,
      fieldArrayIndexLimit: 0,
      fileSize: mostBytes,
      files: 1,
      parts: 12,
      headerPairs: 50,
    },
  }).single('file');
}

type Incoming = Readable & Partial<IncomingMessage> & { file?: Express.Multer.File; body?: Record<string, unknown> };

function asIncoming(request: Request): Incoming {
  const headers: Record<string, string> = Object.fromEntries(request.headers);
  // multer looks for a length or a chunked body, and a web request may name neither.
  if (!headers['content-length']) headers['transfer-encoding'] = 'chunked';
  const readable = Readable.fromWeb(request.body as never) as Incoming;
  // A cut connection ends the stream with an error that multer reports; without a listener it would end the process.
  readable.on('error', () => {});
  return Object.assign(readable, { headers, method: request.method, url: request.url });
}

function asProblem(error: unknown, mostBytes: number): AppError {
  if (error instanceof AppError) return error;
  if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') {
    return tooLarge(mostBytes);
  }
  return new AppError(
    'bad-request',
    'The upload could not be read: it was cut off, or is no multipart body. Send it again.',
  );
}

function tooLarge(mostBytes: number): AppError {
  const most = Math.round(mostBytes / 1e6);
  return new AppError(
    'too-large',
    `The file is larger than ${most} MB. Send a smaller one, or cut it to what you need.`,
  );
}

/** Without control characters and folders, at most 200 characters. */
function readableName(name: string): string {
  const last = name.split(/[/\\]/).pop() ?? '';

  const clean = last.replace(/[\u0000-\u001f\u007f\u200b-\u200f\u202a-\u202e]/g, '').trim();
  return clean.slice(0, 200) || 'unnamed';
}
