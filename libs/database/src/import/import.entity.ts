import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { ImportKind, ImportState } from '@quarterpoise/dto';
import { CentsType } from '../cents.type.js';

/** An uploaded file and how far it has come. Its bytes lie in `import_chunk`. */
export const ImportEntity = defineEntity({
  name: 'Import',
  tableName: 'import',
  properties: {
    id: p.uuid().primary(),
    planId: p.uuid(),
    quarterId: p.uuid().nullable(),
    kind: p.string().$type<ImportKind>(),
    fileName: p.string(),
    byteSize: p.type(CentsType),
    sha256: p.blob().nullable(),
    state: p.string().$type<ImportState>(),
    statedRows: p.integer(),
    statedSumCents: p.type(CentsType).nullable(),
    progressBytes: p.type(CentsType),
    rowCount: p.integer().nullable(),
    sumCents: p.type(CentsType).nullable(),
    newCount: p.integer().nullable(),
    changedCount: p.integer().nullable(),
    reversedCount: p.integer().nullable(),
    unchangedCount: p.integer().nullable(),
    errorCount: p.integer(),
    notices: p.json(),
    totalsByKind: p.json(),
    problemCode: p.string().nullable(),
    problemDetail: p.text().nullable(),
    ledgerVersion: p.integer().nullable(),
    uploadedBy: p.uuid(),
    uploadedAt: p.datetime(),
    checkedAt: p.datetime().nullable(),
    committedBy: p.uuid().nullable(),
    committedAt: p.datetime().nullable(),
  },
});
export type Import = InferEntity<typeof ImportEntity>;
