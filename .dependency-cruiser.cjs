/** Import directions that hold the architecture up. */
const domain = 'calendar|team|pathway|abilities';
module.exports = {
  forbidden: [
    {
      name: 'no-cycles',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'packages-never-import-apps',
      severity: 'error',
      from: { path: '^packages/' },
      to: { path: '^apps/' },
    },
    {
      name: 'the-core-stays-pure',
      severity: 'error',
      from: { path: `^packages/(${domain})/src/`, pathNot: '\\.test\\.ts$' },
      to: {
        path: '^packages/(contract|sample-team)/|^node_modules/(?!(@casl|@ucast|zod|rrule|tslib))|^(node:|fs|path|crypto|http)',
      },
    },
    {
      name: 'the-board-never-imports-the-api',
      severity: 'error',
      from: { path: '^apps/board/' },
      to: { path: '^apps/api/' },
    },
    {
      name: 'the-api-never-imports-the-board',
      severity: 'error',
      from: { path: '^apps/api/', pathNot: '^apps/api/bench/' },
      to: { path: '^apps/board/' },
    },
    {
      name: 'features-never-meet',
      severity: 'error',
      from: { path: '^apps/board/src/features/([^/]+)/' },
      to: { path: '^apps/board/src/(features/([^/]+)|pages)/', pathNot: '^apps/board/src/features/$1/' },
    },
    {
      name: 'the-kit-knows-no-feature',
      severity: 'error',
      from: { path: '^apps/board/src/(ui|marks|ruler)/' },
      to: { path: '^apps/board/src/(features|pages|queries|api)/' },
    },
    {
      name: 'testing-is-for-tests',
      severity: 'error',
      from: { path: '^apps/', pathNot: '(\\.test\\.tsx?$|/testing/)' },
      to: { path: '^apps/[^/]+/src/testing/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)(node_modules|dist)/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'default'],
      extensions: ['.ts', '.tsx', '.mjs', '.js'],
    },
  },
};
