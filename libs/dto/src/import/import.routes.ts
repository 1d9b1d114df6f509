import { z } from 'zod';
import { idParams, pageOf, pageQuery, planParams } from '../http/page.dto.js';
import { defineRoute, hats } from '../http/route.js';
import { importRowError, importUploadFields, importView } from './import.dto.js';

const administrator = hats('administrator');
const staff = hats('administrator', 'approver', 'auditor');

export const importRoutes = {
  upload: defineRoute({
    id: 'imports.upload',
    method: 'POST',
    path: '/plans/:planId/imports',
    access: administrator,
    summary: 'Upload a file; it is checked, nothing is loaded yet',
    params: planParams,
    body: importUploadFields,
    consumes: 'multipart',
    response: importView,
    status: 202,
  }),
  list: defineRoute({
    id: 'imports.list',
    method: 'GET',
    path: '/plans/:planId/imports',
    access: staff,
    summary: 'Files of a plan, newest first',
    params: planParams,
    query: pageQuery.extend({ quarterId: z.uuid().optional() }),
    response: pageOf(importView),
  }),
  view: defineRoute({
    id: 'imports.view',
    method: 'GET',
    path: '/imports/:id',
    access: staff,
    summary: 'One file: state, totals, what would change',
    params: idParams,
    response: importView,
  }),
  errors: defineRoute({
    id: 'imports.errors',
    method: 'GET',
    path: '/imports/:id/errors',
    access: staff,
    summary: 'Rows with errors',
    params: idParams,
    query: pageQuery,
    response: pageOf(importRowError),
  }),
  errorsFile: defineRoute({
    id: 'imports.errors-file',
    method: 'GET',
    path: '/imports/:id/errors.csv',
    access: staff,
    summary: 'Rows with errors as CSV',
    params: idParams,
    produces: 'csv',
  }),
  commit: defineRoute({
    id: 'imports.commit',
    method: 'POST',
    path: '/imports/:id/commit',
    access: administrator,
    summary: 'Load the previewed file, all or nothing',
    params: idParams,
    response: importView,
    status: 202,
  }),
  discard: defineRoute({
    id: 'imports.discard',
    method: 'POST',
    path: '/imports/:id/discard',
    access: administrator,
    summary: 'Put a previewed file away unloaded',
    params: idParams,
    response: importView,
  }),
  events: defineRoute({
    id: 'imports.events',
    method: 'GET',
    path: '/imports/:id/events',
    access: staff,
    summary: 'Progress of checking or loading',
    params: idParams,
    produces: 'events',
  }),
};
