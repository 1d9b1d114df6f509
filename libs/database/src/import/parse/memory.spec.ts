import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { expect, it } from 'vitest';
import { readImportFile } from './import-file.reader.js';

const MEGABYTES = 60;

/** An activity file of the wanted size, made while it is read. Every tenth row has a quoted value with a line break. */
function* activityFile(megabytes: number) {
  yield Buffer.from('reference,participant_number,effective_on,posted_on,kind,source,fund,amount,remark\n');
  let row = 0;
  for (let size = 0; size < megabytes * 1024 * 1024;) {
    let text = '';
    for (let index = 0; index < 1000; index += 1, row += 1) {
      const remark = row % 10 === 0 ? '"two\nlines"' : 'one';
      text += `T-${row},${row % 20_000},2026-07-10,2026-07-13,employee_contribution,pretax,larch_balanced,125.50,${remark}\n`;
    }
    const bytes = Buffer.from(text);
    size += bytes.length;
    yield bytes;
  }
}

setFlagsFromString('--expose-gc');
const collectGarbage = runInNewContext('gc') as () => void;

/** Bytes that are really held: garbage is collected first. */
function heldBytes(): number {
  collectGarbage();
  const { heapUsed, arrayBuffers } = process.memoryUsage();
  return heapUsed + arrayBuffers;
}

// 60 MB here so that the test stays short; a file of 300 MB, read the same way once by hand, holds no more
it(`reads ${MEGABYTES} MB without holding them`, { timeout: 60_000 }, async () => {
  let batches = 0;
  let rows = 0;
  let lastLine = 0;
  const held: number[] = [];
  for await (const batch of readImportFile(activityFile(MEGABYTES), 'activity', 'activity.csv')) {
    rows += batch.rows.length;
    lastLine = batch.rows.at(-1)?.line ?? lastLine;
    if (batches % 100 === 50) held.push(heldBytes());
    batches += 1;
  }
  expect(rows).toBeGreaterThan(500_000);
  // the header, every row and the second lines of one in ten of them, less what follows the start of the last
  expect(lastLine).toBe(1 + rows + Math.ceil((rows - 1) / 10));
  expect(held.length).toBeGreaterThan(4);
  expect((Math.max(...held) - held[0]!) / 1024 / 1024).toBeLessThan(4);
});
