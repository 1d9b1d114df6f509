import type { MultipartFile } from '@fastify/multipart';
import type { FastifyRequest } from 'fastify';
import { ProblemException } from '../problems/problem.exception.js';
import type { UploadedFile } from './route-input.js';

/** Limits of the fields beside a file; the file itself has none, it is never held in memory. */
export const MULTIPART_LIMITS = { fileSize: Number.POSITIVE_INFINITY, files: 1, fields: 20, fieldSize: 4_096 };

/**
 * Reads the fields that come before the file and hands the file over as a stream.
 * @throws ProblemException malformed-request when the request is not multipart, is broken, or carries no file.
 */
export async function readUpload(
  request: FastifyRequest,
): Promise<{ fields: Record<string, string>; file: UploadedFile }> {
  if (!request.isMultipart()) {
    throw new ProblemException('malformed-request', 'Send the file as multipart/form-data, its fields before it.');
  }
  const fields: Record<string, string> = {};
  const parts = request.parts()[Symbol.asyncIterator]();
  // not for…of: leaving a loop early would end the parts, and the file with them
  for (let step = await nextPart(parts); !step.done; step = await nextPart(parts)) {
    const part = step.value;
    if (part.type === 'file') return { fields, file: { fileName: part.filename, stream: part.file } };
    fields[part.fieldname] = String(part.value);
  }
  throw new ProblemException('malformed-request', 'There is no file in the request.');
}

type Part = MultipartFile | { type: 'field'; fieldname: string; value: unknown };

async function nextPart(parts: AsyncIterator<Part>): Promise<IteratorResult<Part>> {
  try {
    return await parts.next();
  } catch (error) {
    throw new ProblemException('malformed-request', error instanceof Error ? error.message : undefined);
  }
}

/** Lets the rest of an upload run out, so that the sender can read why it was refused. */
export function discardUpload(file: UploadedFile | undefined): void {
  if (!file || file.stream.readableEnded || file.stream.destroyed) return;
  file.stream.on('error', () => undefined).resume();
}
