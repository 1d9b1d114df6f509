/**
 * Who may import whom. Paths, not package names, so that the rules hold for an import by name and for one by path alike; names are
 * resolved to the sources by the paths in tsconfig.base.json (the built files are left out, a rule would see nothing through them).
 * scripts/lint/import-rules.spec.ts plants a violation of each rule.
 * @type {import('dependency-cruiser').IConfiguration}
 */
module.exports = {
  forbidden: [
    {
      name: 'no-circular',
      comment: 'Modules that import each other cannot be understood, tested or loaded alone.',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'dto-and-returns-stand-alone',
      comment: 'The contracts and the mathematics import nothing of ours.',
      severity: 'error',
      from: { path: '^libs/(dto|returns)/src/' },
      to: { path: '^(libs|apps|seeds|scripts)/', pathNot: '^libs/$1/' },
    },
    {
      name: 'returns-is-pure',
      comment: 'The mathematics runs in the browser too: no input or output, nothing of Node.js.',
      severity: 'error',
      from: { path: '^libs/returns/src/', pathNot: '\\.spec\\.ts$' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'rules-know-contracts-and-mathematics-only',
      severity: 'error',
      from: { path: '^libs/rules/src/' },
      to: { path: '^(libs|apps|seeds|scripts)/', pathNot: '^libs/(rules|dto|returns)/' },
    },
    {
      name: 'database-knows-rules-and-contracts-only',
      severity: 'error',
      from: { path: '^libs/database/src/' },
      to: { path: '^(libs|apps|seeds|scripts)/', pathNot: '^libs/(database|rules|dto)/' },
    },
    {
      name: 'web-knows-no-database',
      severity: 'error',
      from: { path: '^apps/web/src/' },
      to: { path: '^(libs|apps|seeds|scripts)/', pathNot: '^(apps/web|libs/(dto|rules|returns))/' },
    },
    {
      name: 'nobody-imports-an-app',
      comment: 'An app imports libraries; what two apps need belongs into one.',
      severity: 'error',
      from: { path: '^(libs|apps|seeds|scripts)/([^/]+)/' },
      to: { path: '^apps/', pathNot: '^$1/$2/' },
    },
    {
      name: 'apps-stay-clear-of-scripts-and-seeds',
      severity: 'error',
      from: { path: '^(libs|apps)/[^/]+/src/' },
      to: { path: '^(scripts|seeds)/' },
    },
    {
      name: 'libraries-by-their-entry',
      comment:
        'A library is imported by its name; its inner files are its own. The services scripts must run without building it.',
      severity: 'error',
      from: { path: '^(libs|apps|seeds|scripts)/([^/]+)', pathNot: '^scripts/services/' },
      to: { path: '^libs/[^/]+/src/', pathNot: ['^libs/[^/]+/src/(testing/)?index\\.ts$', '^$1/$2/'] },
    },
    {
      name: 'product-code-without-test-code',
      severity: 'error',
      from: { path: '^(libs|apps)/[^/]+/src/', pathNot: ['\\.(spec|test)\\.tsx?$', '/testing/'] },
      to: { path: ['\\.(spec|test)\\.tsx?$', '/testing/'] },
    },
    {
      name: 'web-features-stay-apart',
      comment: 'Features never import each other; a route puts them together.',
      severity: 'error',
      from: { path: '^apps/web/src/features/([^/]+)/' },
      to: { path: '^apps/web/src/features/', pathNot: '^apps/web/src/features/$1/' },
    },
    {
      name: 'web-shared-parts-know-no-feature',
      severity: 'error',
      from: { path: '^apps/web/src/(components|lib|theme|i18n)/' },
      to: { path: '^apps/web/src/(features|app/routes)/' },
    },
    {
      name: 'everything-resolves',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true },
    },
  ],
  options: {
    exclude: { path: '(^|/)(dist|\\.data|test-results|playwright-report)/' },
    doNotFollow: { path: 'node_modules' },
    tsConfig: { fileName: 'tsconfig.base.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};
