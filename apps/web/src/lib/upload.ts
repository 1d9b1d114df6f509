import type { ImportView } from '@quarterpoise/dto';
import { addressOf, csrfHeaders } from './api-client';
import { problemFrom, ProblemError } from './problem';
import type { RouteBody } from './routes';

export interface UploadInput {
  planId: string;
  fields: RouteBody<'imports.upload'>;
  file: File;
  idempotencyKey: string;
  signal: AbortSignal;
  /** Share of the bytes that have left, 0 to 1. */
  onProgress(share: number): void;
}

/**
 * Sends a file as multipart. XMLHttpRequest, because fetch cannot tell how much has been sent.
 * The fields go before the file: the service streams the file and must know by then what it is.
 */
export function uploadImport({
  planId,
  fields,
  file,
  idempotencyKey,
  signal,
  onProgress,
}: UploadInput): Promise<ImportView> {
  const form = new FormData();
  for (const [name, value] of Object.entries(fields)) {
    if (value !== undefined && value !== null && value !== '') form.append(name, String(value));
  }
  form.append('file', file, file.name);

  return new Promise((resolve, reject) => {
    const call = new XMLHttpRequest();
    call.open('POST', addressOf('imports.upload', { planId }));
    call.setRequestHeader('accept', 'application/json');
    call.setRequestHeader('idempotency-key', idempotencyKey);
    for (const [name, value] of Object.entries(csrfHeaders())) call.setRequestHeader(name, value);
    call.upload.onprogress = (event) => {
      if (event.lengthComputable) onProgress(event.loaded / event.total);
    };
    call.onload = () => {
      if (call.status >= 200 && call.status < 300) resolve(JSON.parse(call.responseText) as ImportView);
      else reject(problemFrom(call.status, call.responseText, call.getResponseHeader('retry-after')));
    };
    call.onerror = () => reject(new ProblemError({ code: 'unreachable', status: 0 }));
    call.onabort = () => reject(new DOMException('The upload was stopped', 'AbortError'));
    signal.addEventListener('abort', () => call.abort(), { once: true });
    call.send(form);
  });
}
