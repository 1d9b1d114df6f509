import useSWR from 'swr';
import { ProblemError } from '../../../lib/problem';

const REFRESH_MS = 10_000;

/** What a part says of itself; `behind` is a database whose schema is older than the service. */
export type PartState = 'up' | 'down' | 'behind';

export interface Health {
  isReady: boolean;
  checks: Record<string, PartState>;
}

/** Health lies outside the contract's routes, and answers 200 and 503 both carry the report; hence a read of its own. */
async function readHealth(address: string): Promise<Health> {
  try {
    const response = await fetch(address, { headers: { accept: 'application/json' } });
    const report = (await response.json()) as { checks?: Record<string, PartState> };
    return { isReady: response.ok, checks: report.checks ?? {} };
  } catch {
    throw new ProblemError({ code: 'unreachable', status: 0 });
  }
}

export const useHealth = () =>
  useSWR<Health, ProblemError>('/api/health/ready', readHealth, { refreshInterval: REFRESH_MS });
