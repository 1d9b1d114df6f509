import { cpSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inProject } from '../project-root.js';
import { runTool } from '../tools.js';

/** A small project with one breach of each rule. Imports by the packages' names must be seen through to the sources. */
const FILES: Readonly<Record<string, string>> = {
  'libs/dto/src/index.ts': `import '@quarterpoise/returns';`,
  'libs/returns/src/index.ts': `import 'node:fs'; import './one.js';`,
  'libs/returns/src/one.ts': `import { two } from './two.js'; export const one = () => two;`,
  'libs/returns/src/two.ts': `import { one } from './one.js'; export const two = () => one;`,
  'libs/rules/src/index.ts': `import '@quarterpoise/database';`,
  'libs/database/src/index.ts': `import '@quarterpoise/returns';`,
  'libs/database/src/testing/index.ts': `export {};`,
  'apps/web/src/app/main.ts': `import '@quarterpoise/database'; import '@quarterpoise/absent';`,
  'apps/web/src/features/one/panel.ts': `import '../two/panel.js'; import '../../components/button.js';`,
  'apps/web/src/features/two/panel.ts': `export {};`,
  'apps/web/src/components/button.ts': `import '../features/two/panel.js';`,
  'apps/api/src/main.ts': `import '../../worker/src/main.js'; import '../../../libs/database/src/ledger.js'; import './own.js';`,
  'apps/api/src/own.ts': `import '@quarterpoise/database/testing';`,
  'apps/worker/src/main.ts': `import '../../../scripts/start.js';`,
  'libs/database/src/ledger.ts': `export {};`,
  'scripts/start.ts': `import '@quarterpoise/database';`,
  'seeds/src/seed.ts': `import '@quarterpoise/database';`,
};

/** Rule, who breaks it, what is imported there. */
const BREACHES: readonly (readonly [rule: string, from: string, to: string])[] = [
  ['dto-and-returns-stand-alone', 'libs/dto/src/index.ts', 'libs/returns/src/index.ts'],
  ['returns-is-pure', 'libs/returns/src/index.ts', 'fs'],
  ['no-circular', 'libs/returns/src/one.ts', 'libs/returns/src/two.ts'],
  ['rules-know-contracts-and-mathematics-only', 'libs/rules/src/index.ts', 'libs/database/src/index.ts'],
  ['database-knows-rules-and-contracts-only', 'libs/database/src/index.ts', 'libs/returns/src/index.ts'],
  ['web-knows-no-database', 'apps/web/src/app/main.ts', 'libs/database/src/index.ts'],
  ['everything-resolves', 'apps/web/src/app/main.ts', '@quarterpoise/absent'],
  ['web-features-stay-apart', 'apps/web/src/features/one/panel.ts', 'apps/web/src/features/two/panel.ts'],
  ['web-shared-parts-know-no-feature', 'apps/web/src/components/button.ts', 'apps/web/src/features/two/panel.ts'],
  ['nobody-imports-an-app', 'apps/api/src/main.ts', 'apps/worker/src/main.ts'],
  ['libraries-by-their-entry', 'apps/api/src/main.ts', 'libs/database/src/ledger.ts'],
  ['product-code-without-test-code', 'apps/api/src/own.ts', 'libs/database/src/testing/index.ts'],
  ['apps-stay-clear-of-scripts-and-seeds', 'apps/worker/src/main.ts', 'scripts/start.ts'],
];

interface Report {
  readonly summary: {
    readonly violations: readonly { readonly from: string; readonly to: string; readonly rule: { name: string } }[];
  };
}

let folder: string;
let found: string[];
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'qp-imports-'));
  for (const [path, content] of Object.entries(FILES)) {
    mkdirSync(join(folder, dirname(path)), { recursive: true });
    writeFileSync(join(folder, path), content);
  }
  cpSync(inProject('tsconfig.base.json'), join(folder, 'tsconfig.base.json'));
  const { output } = await runTool(
    'depcruise',
    ['libs', 'apps', 'scripts', 'seeds', '--config', inProject('.dependency-cruiser.cjs'), '--output-type', 'json'],
    { cwd: folder },
  );
  const { summary } = JSON.parse(output) as Report;
  found = summary.violations.map((violation) => `${violation.rule.name}: ${violation.from} → ${violation.to}`);
}, 60_000);
afterAll(() => rmSync(folder, { recursive: true }));

describe('rules on who imports whom', () => {
  it.each(BREACHES)('%s catches its planted breach', (rule, from, to) => {
    expect(found).toContain(`${rule}: ${from} → ${to}`);
  });

  it('leave alone what is allowed', () => {
    const planted = BREACHES.map(([rule, from, to]) => `${rule}: ${from} → ${to}`);
    // a circle is reported from each of its modules
    const other = found.filter((one) => !planted.includes(one) && !one.startsWith('no-circular: libs/returns/'));
    expect(other).toEqual([]);
  });
});
