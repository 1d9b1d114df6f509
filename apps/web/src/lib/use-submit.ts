import { useRef, useState } from 'react';
import { newIdempotencyKey, request, type RequestInput } from './api-client';
import { asProblem, type ProblemError } from './problem';
import type { RouteId, RouteResponse } from './routes';
import { useSessionState } from './session';

export interface Submit<Id extends RouteId> {
  /** Resolves with the answer, or with undefined after a refusal, which is then in `problem`. */
  submit(input: Omit<RequestInput<Id>, 'idempotencyKey' | 'signal'>): Promise<RouteResponse<Id> | undefined>;
  isBusy: boolean;
  problem: ProblemError | null;
  clearProblem(): void;
}

/**
 * One write, asked for by a person. The idempotency key stays the same while no definite answer has come, so that pressing again
 * after a lost line does not do the work twice; a changed body is a new intention and gets a new key.
 */
export function useSubmit<Id extends RouteId>(id: Id): Submit<Id> {
  const [isBusy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemError | null>(null);
  const pending = useRef<{ intention: string; key: string } | null>(null);
  const { end } = useSessionState();

  return {
    isBusy,
    problem,
    clearProblem: () => setProblem(null),
    async submit(input) {
      const intention = JSON.stringify(input);
      if (pending.current?.intention !== intention) pending.current = { intention, key: newIdempotencyKey() };
      setBusy(true);
      setProblem(null);
      try {
        const answer = await request(id, { ...input, idempotencyKey: pending.current.key } as RequestInput<Id>);
        pending.current = null;
        return answer;
      } catch (error) {
        const refusal = asProblem(error);
        const isDefinite = refusal.status >= 400 && refusal.status < 500;
        if (isDefinite) pending.current = null;
        if (refusal.code === 'not-signed-in') end();
        setProblem(refusal);
        return undefined;
      } finally {
        setBusy(false);
      }
    },
  };
}
