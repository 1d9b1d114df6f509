import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { inProject, PROJECT_ROOT } from '../project-root.js';
import { runTool, twoAtATime } from '../tools.js';
import { contentHash } from './content-hash.js';

interface BuildTarget {
  readonly folder: string;
  /** What goes into it, besides its own sources. */
  readonly alsoFrom: readonly string[];
  readonly tool: 'swc' | 'vite';
}

const backend = (folder: string): BuildTarget => ({ folder, alsoFrom: ['.swcrc'], tool: 'swc' });

const TARGETS: readonly BuildTarget[] = [
  {
    folder: 'apps/web',
    alsoFrom: ['libs/dto/src', 'libs/rules/src', 'libs/returns/src', 'tsconfig.base.json'],
    tool: 'vite',
  },
  backend('libs/dto'),
  backend('libs/returns'),
  backend('libs/rules'),
  backend('libs/database'),
  backend('apps/api'),
  backend('apps/worker'),
];

const isTest = (path: string) => /\.(spec|test)\.tsx?$/.test(path);

/**
 * Builds what has changed since it was last built: the packages of the server with SWC, the web with Vite.
 * @returns the folders that were built anew
 * @throws Error with the tool's own message
 */
export async function build(): Promise<string[]> {
  const built = await twoAtATime(TARGETS, buildTarget);
  return built.filter((folder) => folder !== null);
}

async function buildTarget(target: BuildTarget): Promise<string | null> {
  const { folder } = target;
  const own = ['src', 'public', 'index.html', 'package.json', 'tsconfig.json', 'vite.config.ts'];
  const sources = [...own.map((name) => join(folder, name)), ...target.alsoFrom, 'package-lock.json'];
  const hash = contentHash(PROJECT_ROOT, sources, isTest);
  const mark = inProject(folder, 'dist/.built-from');
  if (existsSync(mark) && readFileSync(mark, 'utf8') === hash) return null;
  // with everything of the last build: a source that is gone must not live on as its output
  rmSync(inProject(folder, 'dist'), { recursive: true, force: true });
  const args =
    target.tool === 'vite'
      ? ['build', '--logLevel', 'warn']
      : [
          'src',
          '--out-dir=dist',
          `--config-file=${inProject('.swcrc')}`,
          '--strip-leading-paths',
          '--copy-files',
          '--ignore=**/*.spec.ts',
          '--quiet',
        ];
  const { code, output } = await runTool(target.tool, args, { cwd: inProject(folder) });
  if (code !== 0 || !existsSync(inProject(folder, 'dist'))) {
    throw new Error(`${folder} cannot be built:\n${output.trim() || 'it has no sources'}`);
  }
  // last, so that an interrupted build is not taken for a finished one
  writeFileSync(mark, hash);
  return folder;
}
