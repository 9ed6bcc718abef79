/**
 * The house: which folder may import what (the table of DEVELOPERS.md, "The house"). Each entry lists all that is
 * allowed; anything else is a violation. Packages are named; Node's own modules are `node`.
 */
const core =
  '^(node:)?(assert|buffer|child_process|crypto|events|fs|http|https|net|os|path|process|readline|stream|timers|url|util|worker_threads)(/|$)';
const npm = (...names) => `^node_modules/(@types/)?(${names.join('|')})(/|$)`;
const anyPackageBut = (...names) => `^node_modules/(?!(@types/)?(${names.join('|')})(/|$))`;

const SERVER_PACKAGES = [
  'pg',
  'kysely',
  'graphile-worker',
  'nodemailer',
  '@node-rs',
  'smtp-server',
  'mailparser',
  '@aws-sdk',
  'sharp',
  'file-type',
  'pdfkit',
];
const EDGES = ['auth', 'http', 'client', 'mail', 'papers', 'storage', 'launch'];

/** An edge takes what it needs from the inside of the house, but nothing of the other edges. */
const edge = (name, also = []) => ({
  name: `lib/${name}`,
  from: `^lib/${name}/`,
  to: [
    `^lib/${name}/`,
    '^lib/(domain|schemas|actions)/',
    '^lib/(context|enqueue|env|errors)\\.ts$',
    '^db/',
    '^node_modules/',
    core,
    ...also,
  ],
});

const HOUSE = [
  {
    name: 'app/api',
    from: '^app/api/',
    to: [
      '^app/api/',
      '^lib/(actions|http|papers|schemas|storage)/',
      '^lib/auth/',
      npm('next', 'next-auth', 'zod'),
    ],
  },
  {
    name: 'app pages',
    from: '^app/(?!api/)',
    to: [
      '^app/(?!api/)',
      '^lib/(actions|auth|client|schemas)/',
      '^components/',
      npm('next', 'next-auth', 'react', '@fontsource-variable'),
    ],
  },
  {
    name: 'components/ui',
    from: '^components/ui/',
    to: ['^components/ui/', anyPackageBut(...SERVER_PACKAGES, 'next-auth')],
  },
  {
    name: 'components/<noun>',
    from: '^components/(?!ui/)',
    to: ['^components/', '^lib/(domain|schemas|client)/', anyPackageBut(...SERVER_PACKAGES, 'next-auth')],
  },
  { name: 'lib/domain', from: '^lib/domain/', to: ['^lib/domain/', npm('rrule')] },
  { name: 'lib/schemas', from: '^lib/schemas/', to: ['^lib/(schemas|domain)/', npm('zod')] },
  {
    name: 'lib/actions',
    from: '^lib/actions/',
    to: [
      '^lib/(actions|domain|schemas|secrets)/',
      '^lib/(context|enqueue|errors|links)\\.ts$',
      '^db/(queries/|tables\\.ts|transaction\\.ts|migrate\\.ts)',
      npm('kysely'),
    ],
  },
  {
    name: 'lib/context',
    from: '^lib/context\\.ts$',
    to: ['^lib/domain/', '^db/tables\\.ts$', npm('kysely')],
  },
  {
    name: 'lib/enqueue',
    from: '^lib/enqueue\\.ts$',
    to: ['^lib/schemas/', '^db/tables\\.ts$', npm('kysely')],
  },
  { name: 'lib/links', from: '^lib/links\\.ts$', to: ['^lib/env\\.ts$'] },
  { name: 'lib/secrets', from: '^lib/secrets/', to: ['^lib/secrets/', npm('@node-rs'), core] },
  { name: 'lib/errors', from: '^lib/errors\\.ts$', to: [] },
  { name: 'lib/env', from: '^lib/env\\.ts$', to: [npm('zod')] },
  edge('auth'),
  edge('http', ['^lib/auth/(actor|next-auth)\\.ts$']),
  edge('mail'),
  edge('papers'),
  edge('storage'),
  // The launcher runs the local mailbox; nothing else of the product takes from tests.
  edge('launch', ['^tests/fakes/']),
  {
    name: 'lib/client',
    from: '^lib/client/',
    to: ['^lib/(client|domain|schemas)/', '^lib/errors\\.ts$', anyPackageBut(...SERVER_PACKAGES)],
  },
  {
    name: 'db/queries',
    from: '^db/queries/',
    to: ['^db/(queries/|tables\\.ts)', '^lib/domain/', npm('kysely')],
  },
  {
    name: 'db/seed',
    from: '^db/seed/',
    to: [
      '^db/',
      '^lib/(actions|domain|schemas)/',
      '^lib/(context|errors|enqueue)\\.ts$',
      npm('kysely'),
      core,
    ],
  },
  {
    name: 'db',
    from: '^db/(?!queries/|seed/)',
    to: ['^db/(?!seed/)', '^lib/env\\.ts$', '^lib/domain/', npm('kysely', 'pg', 'graphile-worker'), core],
  },
  { name: 'migrations', from: '^migrations/', to: [npm('kysely')] },
  {
    name: 'jobs',
    from: '^jobs/',
    to: [
      '^jobs/',
      '^lib/(actions|schemas|mail|storage)/',
      '^lib/(context|env|errors)\\.ts$',
      '^db/client\\.ts$',
      npm('graphile-worker', 'kysely', 'zod'),
      core,
    ],
  },
];

/** Folders the house knows; a source elsewhere is a violation of its own. */
const KNOWN = [
  '^app/',
  '^components/',
  `^lib/(domain|schemas|actions|secrets|${EDGES.join('|')})/`,
  '^lib/(context|enqueue|errors|env|links)\\.ts$',
  '^db/',
  '^migrations/',
  '^jobs/',
  '^(proxy|instrumentation)\\.ts$',
];

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    ...HOUSE.map(({ name, from, to }) => ({
      name,
      comment: `${name} may import: ${to.join(', ') || 'nothing'}`,
      severity: 'error',
      from: { path: from },
      to: { pathNot: to.length > 0 ? to : ['^$'] },
    })),
    {
      name: 'outside the house',
      comment: 'a new folder needs its place in the table first',
      severity: 'error',
      from: { path: '^(lib|db|app|components|jobs|migrations)/', pathNot: KNOWN },
      to: {},
    },
    {
      name: 'circle',
      comment: 'what imports each other is one thing, or needs a third',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
  ],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '\\.css$|^tests/(?!fakes/)' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'types', 'node', 'default'],
      extensions: ['.ts', '.tsx', '.mjs', '.js', '.d.ts'],
    },
  },
};
