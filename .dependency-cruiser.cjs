/** Who may import whom. `npm run lint:imports` enforces it together with the cycle check. */
const floor = (name, from, allowed) => ({
  name,
  severity: 'error',
  from: { path: from },
  to: { path: '^(client|server|shared|db|jobs|test|deploy)/', pathNot: allowed },
});

module.exports = {
  forbidden: [
    {
      name: 'no-cycles',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    floor('shared-imports-nothing-of-ours', '^shared/', '^shared/'),
    floor('client-imports-shared', '^client/', '^(client|shared)/'),
    floor('db-imports-shared', '^db/(?!seeds/)', '^(db|shared)/'),
    floor('server-imports-shared-and-db', '^server/', '^(server|shared|db)/'),
    floor(
      'jobs-import-no-http',
      '^jobs/',
      '^(jobs|shared|db|server/(?!http/|create-app|.*-routes))',
    ),
    {
      name: 'ui-imports-no-feature',
      severity: 'error',
      from: { path: '^client/src/app/ui/' },
      to: { path: '^client/src/app/', pathNot: '^client/src/app/ui/' },
    },
    {
      name: 'ui-makes-no-http',
      severity: 'error',
      from: { path: '^client/src/app/ui/' },
      to: { path: '@angular/common/http' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '\\.spec\\.ts$|^dist/|^\\.local/' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};
