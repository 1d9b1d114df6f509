import type { Hat } from '@quarterpoise/dto';
import { paths } from './paths';

export interface NavigationItem {
  /** Text under `shell:navigation`. */
  text: 'plans' | 'thisQuarter' | 'earlierQuarters' | 'findParticipant' | 'health';
  path: string;
  /** Other addresses that belong to the entry. */
  covers?: string;
}

const SPONSOR: readonly [NavigationItem] = [{ text: 'plans', path: paths.plans, covers: '/quarters' }];

/** What stands in the header for each hat; the first entry is the hat's home. */
export const NAVIGATION: Record<Hat, readonly [NavigationItem, ...NavigationItem[]]> = {
  administrator: SPONSOR,
  approver: SPONSOR,
  auditor: SPONSOR,
  participant: [
    { text: 'thisQuarter', path: paths.ownQuarter },
    { text: 'earlierQuarters', path: paths.ownQuarters },
  ],
  support: [{ text: 'findParticipant', path: paths.support }],
  operator: [{ text: 'health', path: paths.operations }],
};
