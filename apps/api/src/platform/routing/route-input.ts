import type { RouteDefinition } from '@quarterpoise/dto';
import type { Readable } from 'node:stream';
import type { z } from 'zod';

/** A file on its way in. It is not kept anywhere: the handler reads the stream to its end, or the request fails. */
export interface UploadedFile {
  readonly fileName: string;
  readonly stream: Readable;
}

type Parsed<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined;

/** What a handler gets, checked by the schemas of its route. */
export type InputOf<R extends RouteDefinition> = {
  readonly params: Parsed<R['params']>;
  readonly query: Parsed<R['query']>;
  readonly body: Parsed<R['body']>;
} & (R extends { consumes: 'multipart' } ? { readonly file: UploadedFile } : unknown);

/** The same without knowing the route, as interceptors see it. */
export interface RouteInput {
  readonly params: unknown;
  readonly query: unknown;
  readonly body: unknown;
  readonly file?: UploadedFile;
}
