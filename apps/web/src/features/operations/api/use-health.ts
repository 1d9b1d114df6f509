import useSWR from 'swr';
import { ProblemError } from '../../../lib/problem';

const REFRESH_MS = 10_000;

export interface Health {
  isReady: boolean;
  /** Each part of the service with what it says of itself. */
  parts: { name: string; isUp: boolean; detail: string }[];
}

const UP = new Set(['ok', 'up', 'ready', 'true', 'healthy']);

/** Reads the health report: every field that is a word, a yes or an object with a status counts as a part. */
export function healthFrom(isReady: boolean, body: unknown): Health {
  const report = typeof body === 'object' && body !== null ? (body as Record<string, unknown>) : {};
  const nested = report['checks'] ?? report['details'] ?? report['info'];
  const entries = Object.entries(typeof nested === 'object' && nested !== null ? nested : report);
  const parts = entries
    .filter(([name]) => name !== 'status')
    .map(([name, value]) => {
      const word = typeof value === 'object' && value !== null ? (value as Record<string, unknown>)['status'] : value;
      const text = String(word ?? '');
      return { name, isUp: UP.has(text.toLowerCase()), detail: text };
    });
  return { isReady, parts };
}

/** Health is outside the contract's routes and its answers are 200 and 503, both with a report; hence a read of its own. */
async function readHealth(address: string): Promise<Health> {
  try {
    const response = await fetch(address, { headers: { accept: 'application/json' } });
    return healthFrom(response.ok, await response.json().catch(() => null));
  } catch {
    throw new ProblemError({ code: 'unreachable', status: 0 });
  }
}

export const useHealth = () =>
  useSWR<Health, ProblemError>('/api/health/ready', readHealth, { refreshInterval: REFRESH_MS });
