import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { build } from '../build/build.js';
import { lint } from '../lint/lint.js';
import { startProduct } from '../product/start-product.js';
import { inProject, PROJECT_ROOT } from '../project-root.js';
import { startServices } from '../services/start-services.js';
import {
  type Counts,
  countingTheTool,
  countsOfPlaywright,
  countsOfVitest,
  type PlaywrightReport,
  type VitestReport,
} from './report.js';

/** Format, rules, imports, unused code, types: each check counts as one test. */
export async function lintPart(): Promise<Counts> {
  console.log('Lint and types …');
  return lint();
}

/** The given projects of vitest.config.mts; integration tests get a PostgreSQL and a Redis of their own. */
export async function vitestPart(projects: readonly string[], folder: string): Promise<Counts> {
  const services = projects.includes('integration')
    ? await startServices({
        dataFolder: join(folder, 'services'),
        with: ['postgres', 'redis', 'mail'],
        durable: false,
        environment: {
          DATABASE_ADMIN_URL: process.env.DATABASE_ADMIN_URL,
          REDIS_URL: process.env.REDIS_URL,
        },
      })
    : null;
  try {
    const reportFile = join(folder, 'vitest.json');
    const code = await runToEnd(
      'vitest',
      [
        'run',
        ...projects.map((project) => `--project=${project}`),
        '--reporter=default',
        '--reporter=json',
        `--outputFile.json=${reportFile}`,
      ],
      services
        ? {
            DATABASE_ADMIN_URL: services.adminUrl ?? '',
            REDIS_URL: services.redisUrl ?? '',
            SMTP_URL: services.smtpUrl ?? '',
          }
        : {},
    );
    const report = readReport<VitestReport>(reportFile);
    return countingTheTool(report && countsOfVitest(report), code);
  } finally {
    await services?.stop();
  }
}

/** The built product, with the demo in a database of its own, driven in Chromium. */
export async function browserPart(folder: string): Promise<Counts> {
  await build();
  let crash: string | null = null;
  const product = await startProduct({
    dataFolder: join(folder, 'product'),
    durable: false,
    environment: {},
    say: (line) => console.log(line),
    onCrash: (reason) => {
      crash = reason;
      console.log(reason);
    },
  });
  try {
    const reportFile = join(folder, 'playwright.json');
    const code = await runToEnd('playwright', ['test'], {
      QUARTERPOISE_URL: product.url,
      MAILBOX_URL: product.services.mailboxUrl ?? '',
      DEMO_ACCOUNTS_FILE: product.accountsFile,
      E2E_REPORT: reportFile,
    });
    const report = readReport<PlaywrightReport>(reportFile);
    return countingTheTool(report && countsOfPlaywright(report), crash ? 1 : code);
  } finally {
    await product.stop();
  }
}

function readReport<Report>(file: string): Report | null {
  return existsSync(file) ? (JSON.parse(readFileSync(file, 'utf8')) as Report) : null;
}

function runToEnd(
  tool: string,
  args: readonly string[],
  environment: Readonly<Record<string, string>>,
): Promise<number> {
  return new Promise((resolve) => {
    const child = spawn(inProject('node_modules/.bin', tool), args, {
      cwd: PROJECT_ROOT,
      env: { ...process.env, ...environment },
      stdio: ['ignore', 'inherit', 'inherit'],
    });
    // Ctrl-C reaches it by itself
    const passOn = () => child.kill('SIGTERM');
    process.on('SIGTERM', passOn);
    const end = (code: number) => {
      process.off('SIGTERM', passOn);
      resolve(code);
    };
    child.once('error', () => end(1));
    child.once('exit', (code) => end(code ?? 1));
  });
}
