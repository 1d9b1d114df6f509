import type { RouteDefinition } from '@quarterpoise/dto';
import type { z } from 'zod';

/** An answer that never changes for its address, with the tag that lets a client keep it. */
export class Tagged<T> {
  /** @param tag Opaque and without quotes, such as a digest of the data or an id with a version. */
  constructor(
    readonly body: T,
    readonly tag: string,
  ) {}
}

/**
 * JSON text that the database made or keeps, sent as it is: for reads that are so frequent that parsing them costs more than fetching
 * them. In tests and development it is checked against the route's schema all the same.
 */
export class PreparedJson {
  constructor(
    readonly text: string,
    readonly tag: string | null = null,
  ) {}
}

/** A CSV file, sent row by row as it is made. */
export class CsvDownload {
  constructor(
    readonly fileName: string,
    readonly lines: AsyncIterable<string> | Iterable<string>,
  ) {}
}

/** One look at something that is under way. */
export interface Progress<T> {
  readonly data: T;
  /** True when nothing more will come: the stream says `finished` and ends. */
  readonly isFinal: boolean;
}

/**
 * A stream of `progress` events that ends with `finished`. `look` is asked again and again and reads with the reader's scope each time,
 * so that whoever loses the right to see it loses the stream as well. The first look decides between a stream and a problem.
 */
export class ProgressStream<T = unknown> {
  constructor(readonly look: () => Promise<Progress<T>>) {}
}

type Body<R> = R extends { response: infer S extends z.ZodType } ? z.input<S> : never;

/** What the handler of a route may return. */
export type AnswerOf<R extends RouteDefinition> = R extends { produces: 'csv' }
  ? CsvDownload
  : R extends { produces: 'events' }
    ? ProgressStream
    : R extends { response: z.ZodType }
      ? Body<R> | Tagged<Body<R>> | PreparedJson
      : void;
