import type { ImportView } from '@quarterpoise/dto';
import { useEffect, useRef, useState } from 'react';
import { newIdempotencyKey } from '../../../lib/api-client';
import { asProblem, type ProblemError } from '../../../lib/problem';
import { useSessionState } from '../../../lib/session';
import { useRevalidate } from '../../../lib/swr';
import { uploadImport, type UploadInput } from '../../../lib/upload';

export interface Upload {
  /** Share of the bytes sent; null when nothing is under way. */
  share: number | null;
  problem: ProblemError | null;
  start(fields: UploadInput['fields'], file: File): Promise<ImportView | undefined>;
  stop(): void;
}

/** Sends one file. Leaving the screen stops it; nothing half-sent is kept. */
export function useUpload(planId: string): Upload {
  const [share, setShare] = useState<number | null>(null);
  const [problem, setProblem] = useState<ProblemError | null>(null);
  const controller = useRef<AbortController | null>(null);
  const revalidate = useRevalidate();
  const { end } = useSessionState();
  useEffect(() => () => controller.current?.abort(), []);

  return {
    share,
    problem,
    stop: () => controller.current?.abort(),
    async start(fields, file) {
      controller.current = new AbortController();
      setProblem(null);
      setShare(0);
      try {
        const view = await uploadImport({
          planId,
          fields,
          file,
          idempotencyKey: newIdempotencyKey(),
          signal: controller.current.signal,
          onProgress: setShare,
        });
        await revalidate('quarters.view');
        return view;
      } catch (error) {
        if (error instanceof DOMException && error.name === 'AbortError') return undefined;
        const refusal = asProblem(error);
        if (refusal.code === 'not-signed-in') end();
        setProblem(refusal);
        return undefined;
      } finally {
        setShare(null);
      }
    },
  };
}
