import { existsSync, mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { inProject } from './project-root.js';
import { askedToStop, runCommand } from './run-command.js';
import { type DebianPackage, ensurePackages } from './services/debian-packages.js';
import { discardData } from './services/discard-data.js';
import { takeDataFolder } from './services/launcher-lock.js';
import { browserPart, lintPart, vitestPart } from './test/parts.js';
import { type Counts, NOTHING, sum } from './test/report.js';

const PARTS = ['lint', 'unit', 'web', 'integration', 'e2e'] as const;
type Part = (typeof PARTS)[number];
const FOLDER = inProject('.data/test');

/** `npm test`, or `npm test -- unit web …` for some parts of it. The last line gives the counts of everything that ran. */
runCommand(async (args) => {
  const unknown = args.filter((arg) => !PARTS.includes(arg as Part));
  if (unknown.length > 0) throw new Error(`Unknown: ${unknown.join(', ')}. The parts are ${PARTS.join(', ')}.`);
  const wanted = new Set<Part>(
    args.length > 0 ? (args as Part[]) : PARTS.filter((part) => part !== 'e2e' || hasErrands()),
  );
  let isStopping = false;
  void askedToStop().then(() => (isStopping = true));
  mkdirSync(FOLDER, { recursive: true });
  const release = takeDataFolder(FOLDER);
  // what a run that was killed has left
  await discard();
  const results: Counts[] = [];
  const run = async (part: () => Promise<Counts>) => {
    // a part that Ctrl-C ended is followed by no other
    if (isStopping) return;
    results.push(
      await part().catch((error: unknown) => {
        console.error(error instanceof Error ? error.message : error);
        return { passed: 0, failed: 1 };
      }),
    );
  };
  try {
    await run(async () => {
      ensurePackages(packagesFor(wanted));
      return NOTHING;
    });
    if (wanted.has('lint')) await run(lintPart);
    const projects = (['unit', 'web', 'integration'] as const).filter((part) => wanted.has(part));
    if (projects.length > 0) await run(() => vitestPart(projects, FOLDER));
    if (wanted.has('e2e')) await run(() => browserPart(FOLDER));
  } finally {
    await discard();
    release();
  }
  const { passed, failed } = sum(results);
  console.log(`${passed} passed, ${failed} failed`);
  return failed > 0 || isStopping ? 1 : 0;
});

/** The product cannot be started before worker and seeds are written; its errands come with them. */
function hasErrands(): boolean {
  return existsSync(inProject('apps/web/e2e'));
}

async function discard(): Promise<void> {
  for (const place of ['services', 'product']) await discardData(join(FOLDER, place));
  for (const report of ['vitest.json', 'playwright.json']) rmSync(join(FOLDER, report), { force: true });
}

function packagesFor(parts: ReadonlySet<Part>): DebianPackage[] {
  const services = parts.has('integration') || parts.has('e2e');
  return [
    ...(services ? (['postgresql-15', 'redis-server'] as const) : []),
    ...(parts.has('e2e') ? (['chromium'] as const) : []),
  ];
}
