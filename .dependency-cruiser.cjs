/** The arrows of DEVELOPERS.md as rules: a path may import only what its row names. */
const allow = (name, from, allowed) => ({
  name,
  severity: 'error',
  comment: `${from} imports only ${allowed}`,
  from: { path: from },
  to: { path: '^(app|components|server|shared|assets|tests)/', pathNot: allowed },
});

module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    allow('app', '^app/', '^(app|components)/'),
    allow('theme', '^components/theme/', '^components/theme/'),
    allow('ui', '^components/ui/', '^(components/(ui|theme)|assets|shared/(units|errors))'),
    allow('api', '^components/api/', '^(components/(api|ui|theme)/|shared/)'),
    allow('editor', '^components/editor/', '^(components/(editor|api)/|shared/)'),
    allow('canvas', '^components/canvas/', '^(components/(canvas|editor|api|ui|theme)/|shared/|assets/)'),
    allow(
      'panels',
      '^components/panels/',
      '^(components/(panels|editor|api|canvas|ui|theme)/|shared/|assets/)',
    ),
    allow('screens', '^components/screens/', '^(components/|shared/|assets/)'),
    allow('server', '^server/', '^(server|shared|assets)/'),
    allow('policies', '^server/policies/', '^(server/(policies|models)/|shared/)'),
    allow('models', '^server/models/', '^(server/(models|database)/|shared/)'),
    allow(
      'commands',
      '^server/commands/',
      '^(server/((commands|policies|models|database|auth|tasks|estimates|collaboration|config|mail)/|services\\.ts)|shared/)',
    ),
    {
      name: 'migrations-stand-alone',
      severity: 'error',
      from: { path: '^server/database/migrations/' },
      to: { path: '^server/models/' },
    },
    allow('shared', '^shared/', '^(shared|assets)/'),
    allow('numerics', '^shared/numerics/', '^shared/(numerics|errors)'),
    allow('units', '^shared/units/', '^shared/(units|errors)'),
    allow('geometry', '^shared/geometry/', '^shared/(geometry|errors)'),
    allow('em', '^shared/em/', '^shared/(em|numerics|geometry|units|errors)'),
    allow('radio', '^shared/radio/', '^shared/(radio|em|numerics|geometry|units|errors)'),
    allow('layout', '^shared/layout/', '^(shared/(layout|geometry|units|errors|ids)|assets/)'),
    allow(
      'estimate',
      '^shared/estimate/',
      '^shared/(estimate|layout|radio|em|numerics|geometry|units|errors)',
    ),
    allow('shared-api', '^shared/api/', '^shared/(api|layout|estimate|em|errors|ids|units)'),
    {
      name: 'estimate-without-zod',
      severity: 'error',
      comment: 'a worker that pulls in zod weighs half a megabyte',
      from: { path: '^shared/(em|estimate|radio|numerics)/' },
      to: { path: '(node_modules/zod|shared/layout/schema)', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'shared-anywhere',
      severity: 'error',
      comment: 'shared/ imports no Node module, React or network',
      from: { path: '^shared/' },
      to: { path: '^(node:|react|react-native|express|sequelize|socket)', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'shared-without-node-core',
      severity: 'error',
      from: { path: '^shared/' },
      to: { dependencyTypes: ['core'] },
    },
  ],
  options: {
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)(node_modules|\\.expo|\\.data|dist)/' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default'],
    },
  },
};
