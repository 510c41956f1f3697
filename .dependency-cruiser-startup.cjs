// `swaymark --help` must not load the database: main and program reach it by dynamic import alone.
// A second run of its own, because here dynamic and type-only imports are left out of the graph.
module.exports = {
  forbidden: [
    {
      name: 'start-up-without-database',
      comment: 'load the command by `await import(...)` inside its action',
      severity: 'error',
      from: { path: '^src/cli/(?:main|program)[.]ts$' },
      to: { path: '^src/store/|(?:^|/)node_modules/@duckdb/', reachable: true },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { dynamic: true },
    tsPreCompilationDeps: false,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'node', 'types', 'default'] },
  },
};
