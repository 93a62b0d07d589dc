/** Arrows run one way: app -> components -> lib -> db. The pure rooms import nothing of the rest. */
const pure = ['response', 'choosing', 'seen', 'twig', 'doubles'];
/** What a cut's depth is called is the same for these two as for everyone; severity itself imports nothing. */
const readsSeverity = ['seen', 'twig'];
module.exports = {
  forbidden: [
    { name: 'no-circular', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'db-knows-nobody',
      severity: 'error',
      from: { path: '^db/' },
      to: { path: '^(app|components|lib|tests)/' },
    },
    {
      name: 'lib-knows-db-and-content-only',
      severity: 'error',
      from: { path: '^lib/' },
      to: { path: '^(app|components|tests)/' },
    },
    {
      name: 'components-below-app',
      severity: 'error',
      from: { path: '^components/' },
      to: { path: '^(app|db|tests)/' },
    },
    {
      name: 'app-goes-through-lib',
      severity: 'error',
      from: { path: '^app/' },
      to: { path: '^(db|tests)/' },
    },
    ...pure.map((room) => ({
      name: `${room}-is-pure`,
      severity: 'error',
      from: { path: `^lib/${room}/`, pathNot: `^lib/${room}/cli\\.ts$` },
      to: {
        path: '^(app|components|content|db|lib)/',
        pathNot: readsSeverity.includes(room) ? `^lib/(${room}|severity)/` : `^lib/${room}/`,
      },
    })),
    {
      name: 'severity-is-pure',
      severity: 'error',
      from: { path: '^lib/severity/' },
      to: { path: '^(app|components|content|db|lib)/', pathNot: '^lib/severity/' },
    },
    {
      name: 'stand-ins-know-nothing-of-pruning',
      severity: 'error',
      from: { path: '^lib/standins/' },
      to: { path: '^(app|components|content|db|lib)/', pathNot: '^lib/standins/' },
    },
    {
      name: 'no-dev-dependency-in-the-product',
      severity: 'error',
      from: { path: '^(app|components|lib|db)/', pathNot: '^lib/cli/(test|bench)' },
      to: { dependencyTypes: ['npm-dev'], pathNot: '@types/' },
    },
    { name: 'not-to-unresolvable', severity: 'error', from: {}, to: { couldNotResolve: true } },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};
