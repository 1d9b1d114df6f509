import { type BeforeApplicationShutdown, Injectable } from '@nestjs/common';
import { Readable } from 'node:stream';
import { setTimeout as pause } from 'node:timers/promises';
import { problemOf } from '../problems/problem-of.js';
import type { Progress, ProgressStream } from './answers.js';

/** Often enough to look alive, seldom enough for one indexed read per open page to be cheap. */
const LOOK_EVERY_MS = 500;
/** Proxies cut lines that are silent for half a minute or so. */
const HEARTBEAT_EVERY_MS = 15_000;

const event = (name: string, data: unknown) => `event: ${name}\ndata: ${JSON.stringify(data)}\n\n`;

/** Keeps the open progress streams, so that a shutdown can end them: a stream would otherwise hold the server open until its end. */
@Injectable()
export class ProgressStreams implements BeforeApplicationShutdown {
  private readonly open = new Set<AbortController>();

  get count(): number {
    return this.open.size;
  }

  /**
   * Takes the first look and returns the stream that sends it and whatever changes afterwards.
   * The stream stops looking as soon as the client has gone, because the HTTP layer destroys it then.
   * @throws whatever the first look throws, so that a stranger gets a problem and not a stream.
   */
  async start({ look }: ProgressStream): Promise<Readable> {
    const first = await look();
    const controller = new AbortController();
    const stream = new Readable({
      read: () => undefined,
      destroy: (error, done) => {
        controller.abort();
        this.open.delete(controller);
        done(error);
      },
    });
    this.open.add(controller);
    this.feed(stream, first, look, controller.signal).catch((error: Error) => stream.destroy(error));
    return stream;
  }

  beforeApplicationShutdown(): void {
    for (const controller of this.open) controller.abort();
  }

  /** Events are small and few, so a page that reads slowly may have some waiting in memory. */
  private async feed(stream: Readable, first: Progress<unknown>, look: ProgressStream['look'], signal: AbortSignal) {
    for await (const text of this.events(first, look, signal)) stream.push(text);
    if (!stream.destroyed) stream.push(null);
  }

  private async *events(first: Progress<unknown>, look: ProgressStream['look'], signal: AbortSignal) {
    let progress = first;
    let text = JSON.stringify(progress.data);
    let silentSince = Date.now();
    yield event('progress', progress.data);
    while (!progress.isFinal) {
      await pause(LOOK_EVERY_MS, undefined, { signal }).catch(() => undefined);
      if (signal.aborted) return;
      try {
        progress = await look();
      } catch (error) {
        // out of reach for a moment: the next look may succeed; anything else (no longer in scope, gone) ends the stream
        if (problemOf(error)?.code !== 'service-unavailable') return;
        continue;
      }
      const newText = JSON.stringify(progress.data);
      if (newText !== text) {
        text = newText;
        silentSince = Date.now();
        yield event('progress', progress.data);
      } else if (Date.now() - silentSince >= HEARTBEAT_EVERY_MS) {
        silentSince = Date.now();
        yield ': still here\n\n';
      }
    }
    yield event('finished', progress.data);
  }
}
