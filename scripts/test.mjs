import { existsSync } from 'node:fs'
import { resolve } from 'node:path'
import { removeDatabase, startDatabase } from './database.mjs'
import { runCheck } from './check.mjs'
import { ensureBuild } from './support/build.mjs'
import { installPackages } from './support/debian.mjs'
import { ensureModules } from './support/modules.mjs'
import { runPart, runPlaywright, runVitest } from './support/parts.mjs'
import { main, say, Stop } from './support/shell.mjs'

// Everything that must be green, from a fresh clone: `npm test`; one part: `npm test -- --only db`. The long parts
// run only when named.
const PARTS = {
  check: { run: () => runCheck({ isFull: true }) },
  db: { needsDatabase: true, run: (env) => runPart('db', () => runVitest(['db'], env)) },
  build: {
    run: () => runPart('build', () => ensureBuild().then(() => ({ passed: 1, failed: 0, output: '' }))),
  },
  browser: {
    needsDatabase: true,
    needsBrowser: true,
    run: (env) => runPart('browser', () => runPlaywright(['--grep-invert', '@full'], env)),
  },
  faults: {
    needsDatabase: true,
    run: (env) => runPart('faults', () => runVitest(['faults'], { ...env, FAULTS: 'short' })),
  },
}
const LONG_PARTS = {
  'faults-long': {
    needsDatabase: true,
    run: (env) => runPart('faults-long', () => runVitest(['faults'], { ...env, FAULTS: 'long' })),
  },
  'a11y-full': {
    needsDatabase: true,
    needsBrowser: true,
    run: (env) => runPart('a11y-full', () => runPlaywright(['--grep', '@full'], env)),
  },
}
/** What the tests look at papers and pages with. */
const PROGRAMS = {
  chromium: '/usr/bin/chromium',
  'poppler-utils': '/usr/bin/pdftotext',
  'zbar-tools': '/usr/bin/zbarimg',
}

main(async () => {
  process.chdir(resolve(import.meta.dirname, '..'))
  const began = performance.now()
  const chosen = chooseParts(process.argv.slice(2))
  await ensureModules()
  const missing = Object.keys(PROGRAMS).filter((name) => !existsSync(PROGRAMS[name]))
  if (missing.length > 0)
    await installPackages(missing, "The tests look at pages and papers with Debian's programs.")

  const folder = resolve('.data/test', String(process.pid))
  const env = { NODE_ENV: 'test', NEXT_TELEMETRY_DISABLED: '1' }
  const cleanUp = () => removeDatabase(folder)
  for (const signal of ['SIGTERM', 'SIGINT'])
    process.on(signal, () => void cleanUp().finally(() => process.exit(1)))
  const results = []
  try {
    if (chosen.some((part) => part.needsDatabase))
      env.TEST_DATABASE_URL = (await startDatabase(folder, { throwAway: true })).url
    for (const part of chosen) results.push(...[await part.run(env)].flat())
  } finally {
    if (env.TEST_DATABASE_URL) await cleanUp()
  }
  const sum = (field) => results.reduce((total, result) => total + result[field], 0)
  say(`\nAll together ${Math.round((performance.now() - began) / 1000)} s`)
  say(`${sum('passed')} passed, ${sum('failed')} failed`)
  process.exit(sum('failed') > 0 || sum('passed') === 0 ? 1 : 0)
})

function chooseParts(args) {
  const at = args.indexOf('--only')
  const all = { ...PARTS, ...LONG_PARTS }
  const names = at < 0 ? Object.keys(PARTS) : (args[at + 1] ?? '').split(',')
  const unknown = names.filter((name) => !all[name])
  if (unknown.length > 0)
    throw new Stop(`--only takes ${Object.keys(all).join(', ')}; not "${unknown.join(', ')}".`)
  // A page is tested as it is built.
  return names.flatMap((name) =>
    all[name].needsBrowser && !names.includes('build') ? [PARTS.build, all[name]] : [all[name]],
  )
}
