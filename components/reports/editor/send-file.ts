import type { ZodType } from 'zod';
import { ApiProblem } from '@/lib/platform/http/call-api';
import type { FieldProblem } from '@/lib/platform/errors';

interface Sending<T> {
  path: string;
  file: Blob;
  name: string;
  fields?: Record<string, string>;
  answer: ZodType<T>;
  /** 0 to 1 as the bytes travel. */
  onProgress: (share: number) => void;
  signal: AbortSignal;
}

/**
 * Sends one file with its progress: fetch tells nothing of what has travelled, so this is the older request.
 * @throws {ApiProblem} as `callApi` does; code "cancelled" where the member stopped it.
 */
export function sendFile<T>({ path, file, name, fields = {}, answer, onProgress, signal }: Sending<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    const form = new FormData();
    for (const [key, value] of Object.entries(fields)) form.append(key, value);
    form.append('file', file, name);
    const request = new XMLHttpRequest();
    request.open('POST', path);
    request.responseType = 'json';
    request.upload.onprogress = (event) => event.lengthComputable && onProgress(event.loaded / event.total);
    request.onerror = () =>
      reject(new ApiProblem(0, 'offline', 'The connection was lost. The file is still here: send it again.', [], {}));
    request.onabort = () => reject(new ApiProblem(0, 'cancelled', 'Cancelled.', [], {}));
    request.onload = () => {
      if (request.status >= 200 && request.status < 300) return resolve(answer.parse(request.response));
      const problem = (request.response ?? {}) as { title?: string; detail?: string; errors?: FieldProblem[] };
      const detail = problem.detail ?? `The site answered ${request.status}. Send the file again.`;
      reject(new ApiProblem(request.status, problem.title ?? 'unknown', detail, problem.errors ?? [], {}));
    };
    signal.addEventListener('abort', () => request.abort());
    request.send(form);
  });
}
