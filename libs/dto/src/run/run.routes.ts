import { z } from 'zod';
import { idParams, pageOf, pageQuery } from '../http/page.dto.js';
import { defineRoute, hats } from '../http/route.js';
import { resultRow, runSummary } from './run.dto.js';

const staff = hats('administrator', 'approver', 'auditor');

export const runRoutes = {
  start: defineRoute({
    id: 'runs.start',
    method: 'POST',
    path: '/quarters/:id/runs',
    access: hats('administrator'),
    summary: 'Start a quarter-end run, or a rehearsal',
    params: idParams,
    body: z.object({ isRehearsal: z.boolean().default(false) }),
    response: runSummary,
    status: 202,
  }),
  view: defineRoute({
    id: 'runs.view',
    method: 'GET',
    path: '/runs/:id',
    access: staff,
    summary: 'One run',
    params: idParams,
    response: runSummary,
  }),
  cancel: defineRoute({
    id: 'runs.cancel',
    method: 'POST',
    path: '/runs/:id/cancel',
    access: hats('administrator'),
    summary: 'Stop a run that is going',
    params: idParams,
    response: runSummary,
  }),
  events: defineRoute({
    id: 'runs.events',
    method: 'GET',
    path: '/runs/:id/events',
    access: staff,
    summary: 'Progress of a run',
    params: idParams,
    produces: 'events',
  }),
  results: defineRoute({
    id: 'runs.results',
    method: 'GET',
    path: '/runs/:id/results',
    access: staff,
    summary: 'Results by participant number',
    params: idParams,
    query: pageQuery.extend({ search: z.string().max(80).optional() }),
    response: pageOf(resultRow),
  }),
};
