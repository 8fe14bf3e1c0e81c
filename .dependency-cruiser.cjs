/** Imports run one way; see DEVELOPERS.md, "Layout". */
const only = (name, from, allowed, comment) => ({
  name,
  comment,
  severity: 'error',
  from: { path: from },
  to: { path: '^(app|components|lib|models|migrations|worker|tests|scripts)/', pathNot: allowed },
});

module.exports = {
  forbidden: [
    { name: 'no-circle', severity: 'error', from: {}, to: { circular: true } },
    { name: 'no-unresolved', severity: 'error', from: {}, to: { couldNotResolve: true } },
    only('domain-stands-alone', '^lib/domain/', '^lib/domain/', 'The domain is pure.'),
    {
      name: 'domain-is-pure',
      severity: 'error',
      from: { path: '^lib/domain/' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'domain-knows-no-framework',
      severity: 'error',
      from: { path: '^lib/domain/' },
      to: { path: 'node_modules/(react|react-dom|next|dexie|sequelize|pg|uuid)/' },
    },
    only('store-uses-domain', '^lib/store/', '^lib/(store|domain)/', 'store → domain'),
    only('sync-uses-store', '^lib/sync/', '^lib/(sync|store|domain)/', 'sync → store, domain'),
    only('device-uses-store', '^lib/device/', '^lib/(device|store|domain)/', 'device → store, domain'),
    only('server-uses-models', '^lib/server/', '^(lib/(server|domain)/|models/)', 'server → models, domain'),
    only('models-stand-alone', '^models/', '^(models/|lib/domain/)', 'models → domain'),
    only(
      'components-never-server',
      '^components/',
      '^(components/|lib/(store|sync|device|domain)/)',
      'components → store, sync, device, domain',
    ),
    only('api-uses-server', '^app/api/', '^(app/api/|lib/(server|domain)/)', 'app/api → server, domain'),
    only(
      'bench-page-is-client-only',
      '^app/bench/',
      '^(app/bench/|components/|lib/(store|sync|device|domain)/)',
      'the bench never reaches the server',
    ),
    only('worker-stands-alone', '^worker/', '^(worker/|lib/domain/)', 'worker → domain'),
    {
      name: 'models-only-behind-server',
      severity: 'error',
      from: { pathNot: '^(lib/server|migrations|tests|models|scripts)/' },
      to: { path: '^models/' },
    },
    {
      name: 'nothing-imports-tests',
      severity: 'error',
      from: { pathNot: '^(tests|scripts/(benchmarks/|take-pictures))' },
      to: { path: '^tests/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)(\\.next|\\.data|coverage)/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};
