import { idParams, pageOf, planParams } from '../http/page.dto.js';
import { defineRoute, hats } from '../http/route.js';
import { quarterSummary, quarterView } from './quarter.dto.js';

const staff = hats('administrator', 'approver', 'auditor');

export const quarterRoutes = {
  list: defineRoute({
    id: 'quarters.list',
    method: 'GET',
    path: '/plans/:planId/quarters',
    access: staff,
    summary: 'A plan’s quarters, newest first',
    params: planParams,
    response: pageOf(quarterSummary),
  }),
  view: defineRoute({
    id: 'quarters.view',
    method: 'GET',
    path: '/quarters/:id',
    access: staff,
    summary: 'Where a quarter stands',
    params: idParams,
    response: quarterView,
  }),
};
