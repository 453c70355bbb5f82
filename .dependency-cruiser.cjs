/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    { name: 'no-circular', severity: 'error', from: { pathNot: '^server/entities/' }, to: { circular: true } },
    {
      name: 'shared-is-isomorphic',
      severity: 'error',
      from: { path: '^shared/' },
      to: { path: '^(src|server)/|node_modules/(react|express|typeorm|pg)/|^(fs|path|crypto)$' },
    },
    {
      name: 'engines-are-pure',
      severity: 'error',
      from: { path: '^shared/engines/' },
      to: { pathNot: '^shared/(engines|units)/' },
    },
    { name: 'client-not-to-server', severity: 'error', from: { path: '^src/' }, to: { path: '^server/' } },
    { name: 'server-not-to-client', severity: 'error', from: { path: '^server/' }, to: { path: '^src/' } },
    {
      name: 'no-cross-feature',
      severity: 'error',
      from: { path: '^src/features/([^/]+)/' },
      to: { path: '^src/features/', pathNot: '^src/features/$1/' },
    },
    {
      name: 'features-not-to-app',
      severity: 'error',
      from: { path: '^src/(features|components|lib|hooks)/' },
      to: { path: '^src/app/' },
    },
    {
      name: 'components-are-data-free',
      severity: 'error',
      from: { path: '^src/components/' },
      to: { path: '^src/(features|app)/|node_modules/@tanstack/react-query' },
    },
    {
      name: 'writes-in-commands',
      severity: 'error',
      from: { path: '^server/(http/middleware|presenters|policies|queries)/' },
      to: { path: '^server/db/unit-of-work' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    exclude: { path: '^(dist|coverage)/' },
  },
};
