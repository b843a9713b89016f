/** A part of the house: its name is its folder. `types` are parts it may import types from, nothing that runs. */
export type Part = { may: readonly string[]; types?: readonly string[]; packages?: readonly RegExp[] }

const SERVER_PACKAGES =
  /^(sequelize|pg|stripe|nodemailer|graphile-worker|msw|pino|sharp|pdfkit|umzug|smtp-server|mailparser)(\/|$)/
/** Everything but what only the ring may touch. */
const NO_SERVER_PACKAGE = [new RegExp(`^(?!${SERVER_PACKAGES.source.slice(1)})`)]
const ANY = [/./]
const QUERIES_MAY = ['lib/core', 'lib/contracts', 'models', 'lib/db']
/** `lib/auth/secrets` makes and hashes the secrets of mailed links, whoever sends them. */
const SERVICES_MAY = [
  ...QUERIES_MAY,
  'lib/queries',
  'lib/gateways',
  'lib/jobs',
  'lib/config',
  'lib/paths',
  'lib/messages',
  'lib/auth/secrets',
]

/**
 * Which way imports go (architecture.md). A part may always import itself, but for services, which may import
 * only shared steps. Only core lists packages one by one.
 */
export const ARROWS: Readonly<Record<string, Part>> = {
  'lib/core': { may: [], packages: [] },
  'lib/contracts': { may: ['lib/core'], packages: [/^zod$/] },
  'lib/messages': { may: ['lib/core'], packages: [/^zod$/] },
  'lib/paths': { may: ['lib/core'], packages: [] },
  'lib/config': { may: [], packages: [/^zod$/, /^pino$/, /^node:/] },
  models: {
    may: ['lib/core', 'lib/config', 'lib/db'],
    types: ['lib/contracts'],
    packages: [/^sequelize$/, /^pg$/, /^node:/, /^server-only$/],
  },
  'lib/db': {
    may: ['lib/core', 'lib/config', 'models'],
    types: ['lib/contracts'],
    packages: [/^sequelize$/, /^pg$/, /^node:/, /^server-only$/],
  },
  'lib/queries': { may: QUERIES_MAY, packages: ANY },
  'lib/services': { may: SERVICES_MAY, packages: ANY },
  // Signing in is the sign-in library's own tokens and sessions: the one domain that needs lib/auth beneath it.
  'lib/queries/sign-in': { may: [...QUERIES_MAY, 'lib/queries', 'lib/auth', 'lib/config'], packages: ANY },
  'lib/services/sign-in': { may: [...SERVICES_MAY, 'lib/services', 'lib/auth'], packages: ANY },
  'lib/gateways': { may: ['lib/core', 'lib/config', 'lib/db'], types: ['lib/contracts'], packages: ANY },
  'lib/jobs': { may: ['lib/contracts', 'lib/db'], packages: ANY },
  'lib/tasks': {
    may: [
      'lib/services',
      'lib/queries',
      'lib/gateways',
      'emails',
      'lib/jobs',
      'lib/contracts',
      'lib/messages',
      'lib/paths',
      'lib/config',
      'lib/core',
    ],
    packages: NO_SERVER_PACKAGE,
  },
  'lib/auth': {
    may: [
      'lib/core',
      'lib/contracts',
      'lib/config',
      'lib/messages',
      'lib/paths',
      'models',
      'lib/db',
      'lib/jobs',
      'lib/gateways/clock',
    ],
    packages: ANY,
  },
  'lib/http': {
    may: [
      'lib/core',
      'lib/contracts',
      'lib/config',
      'lib/messages',
      'lib/paths',
      'models',
      'lib/db',
      'lib/jobs',
      'lib/gateways/clock',
      'lib/auth',
      'lib/gateways/payments',
    ],
    packages: ANY,
  },
  // The schemas of the facts: a mail is written from a stored row, which is checked when it is read.
  emails: {
    may: ['lib/core', 'lib/messages', 'lib/contracts/mails'],
    types: ['lib/contracts'],
    packages: [/^react/, /^@react-email\//],
  },
  // Printed papers: numbers and words in, a PDF out.
  'lib/papers': {
    may: ['lib/core', 'lib/messages'],
    types: ['lib/contracts'],
    packages: [/^pdfkit$/, /^bwip-js/, /^node:path$/],
  },
  components: {
    may: ['lib/core', 'lib/contracts', 'lib/messages', 'lib/paths'],
    packages: NO_SERVER_PACKAGE,
  },
  app: {
    may: [
      'lib/core',
      'lib/contracts',
      'lib/messages',
      'lib/paths',
      'lib/config',
      'lib/queries',
      'lib/services',
      'lib/jobs',
      'lib/tasks',
      'lib/auth',
      'lib/http',
      'emails',
      'lib/papers',
      'components',
      'fonts',
    ],
    packages: NO_SERVER_PACKAGE,
  },
  fonts: { may: [], packages: [/^next\/font/] },
  seeders: {
    may: [
      'lib/services',
      'lib/queries',
      'lib/contracts',
      'lib/core',
      'models',
      'lib/db',
      'lib/config',
      'lib/paths',
      'lib/messages',
      'lib/jobs',
    ],
    packages: NO_SERVER_PACKAGE,
  },
  migrations: { may: [], packages: ANY },
}

/** Beneath core's own domains, and above them. */
const CORE_ORDER = [
  ['result', 'brand'],
  ['data', 'money', 'stats'],
]
const CORE_TOP = ['states', 'policy']

/** How high a file of core stands: it imports its own height and lower. */
export function coreRank(file: string): number {
  const name = file.split('/')[2]?.replace(/\.ts$/, '') ?? ''
  const low = CORE_ORDER.findIndex((names) => names.includes(name))
  if (low >= 0) return low
  return CORE_TOP.includes(name) ? CORE_ORDER.length + 1 : CORE_ORDER.length
}

/** Whether a service may import this file of the services: shared steps only. */
export const isStep = (file: string) => file.split('/').includes('_steps')
