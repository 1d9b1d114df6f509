import { existsSync, readdirSync } from 'node:fs';
import { inProject } from '../project-root.js';
import { runTool, twoAtATime } from '../tools.js';

interface Check {
  readonly name: string;
  readonly tool: string;
  readonly args: readonly string[];
}

export interface CheckCounts {
  readonly passed: number;
  readonly failed: number;
}

/** Folders that have a program of their own for the type checker; '.' holds scripts and seeds. */
function typedFolders(): string[] {
  const packages = ['libs', 'apps'].flatMap((group) => readdirSync(inProject(group)).map((name) => `${group}/${name}`));
  return ['.', ...packages].filter(
    // the worker has no sources yet
    (folder) =>
      existsSync(inProject(folder, 'tsconfig.json')) &&
      (folder !== 'apps/worker' || existsSync(inProject(folder, 'src/main.ts'))),
  );
}

/** The longest first, so that the two lanes end at about the same time. */
function checks(): Check[] {
  return [
    { name: 'rules that need types (eslint)', tool: 'eslint', args: ['.'] },
    ...typedFolders().map((folder) => ({ name: `types of ${folder}`, tool: 'tsc', args: ['--noEmit', '-p', folder] })),
    {
      name: 'who imports whom (dependency-cruiser)',
      tool: 'depcruise',
      args: ['libs', 'apps', 'scripts', 'seeds', '--config', '.dependency-cruiser.cjs', '--output-type', 'err-long'],
    },
    { name: 'what nobody uses (knip)', tool: 'knip', args: ['--no-progress', '--no-config-hints'] },
    { name: 'format (prettier)', tool: 'prettier', args: ['--check', '--log-level', 'warn', '.'] },
    { name: 'rules (oxlint)', tool: 'oxlint', args: ['--quiet', '--format', 'unix'] },
  ];
}

/** Runs every check and prints what the failing ones say. */
export async function lint(): Promise<CheckCounts> {
  const outcomes = await twoAtATime(checks(), async (check) => {
    const { code, output } = await runTool(check.tool, check.args);
    if (code !== 0) console.log(`\nFAILED ${check.name}\n${output.trim()}`);
    return code === 0;
  });
  const passed = outcomes.filter(Boolean).length;
  return { passed, failed: outcomes.length - passed };
}
