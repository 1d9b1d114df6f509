import { readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const path = (relative: string) => fileURLToPath(new URL(relative, import.meta.url));

// tests run against the sources of the libraries, whatever was last built
const libraries = [
  { find: '@quarterpoise/database/testing', replacement: path('libs/database/src/testing/index.ts') },
  ...readdirSync(path('libs')).map((name) => ({
    find: new RegExp(`^@quarterpoise/${name}$`),
    replacement: path(`libs/${name}/src/index.ts`),
  })),
];

const backend = {
  resolve: { alias: libraries },
  // injection by constructor types works only if decorators leave their metadata, as in the build
  oxc: { decorator: { legacy: true, emitDecoratorMetadata: true } },
};

export default defineConfig({
  test: {
    projects: [
      {
        ...backend,
        test: {
          name: 'unit',
          include: [
            'libs/**/src/**/*.spec.ts',
            'libs/returns/test/**/*.spec.ts',
            'apps/{api,worker}/src/**/*.spec.ts',
            'scripts/**/*.spec.ts',
            'seeds/**/*.spec.ts',
          ],
          exclude: ['**/node_modules/**', '**/dist/**', '**/*.int.spec.ts'],
        },
      },
      {
        ...backend,
        test: {
          name: 'integration',
          include: [
            'libs/*/test/**/*.int.spec.ts',
            'apps/*/test/**/*.int.spec.ts',
            'seeds/**/*.int.spec.ts',
            'scripts/**/*.int.spec.ts',
          ],
          exclude: ['**/node_modules/**', '**/dist/**'],
          globalSetup: 'scripts/test-services.setup.ts',
          pool: 'forks',
          maxWorkers: 2,
          // after the others, which use the processors alone
          sequence: { groupOrder: 1 },
          testTimeout: 60_000,
          hookTimeout: 120_000,
        },
      },
      {
        resolve: { alias: libraries },
        oxc: { jsx: { runtime: 'automatic' } },
        test: {
          name: 'web',
          include: ['apps/web/src/**/*.test.{ts,tsx}'],
          environment: 'jsdom',
          css: false,
          testTimeout: 20_000,
        },
      },
    ],
  },
});
