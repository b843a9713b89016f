import { cpSync, mkdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { removeDatabase, startDatabase } from './database.mjs'
import { main, run, say, Stop } from './support/shell.mjs'
import { BUGS } from '../tests/faults/planted/bugs.mjs'

// Plants one bug after the other into a copy of the project and sees that the test named for it turns red. `npm run
// test:planted`; a part of a bug's name after it plants those alone.
main(async () => {
  process.chdir(resolve(import.meta.dirname, '..'))
  const wanted = process.argv.slice(2).join(' ')
  const chosen = BUGS.filter(({ name }) => name.includes(wanted))
  if (chosen.length === 0) throw new Stop(`no planted bug is called "${wanted}"`)
  const folder = resolve('.data/planted', String(process.pid))
  const copy = join(folder, 'copy')
  const database = join(folder, 'database')
  const survived = []
  try {
    await makeCopy(copy)
    const { url } = await startDatabase(database, { throwAway: true })
    for (const bug of chosen) {
      const seen = await plant(bug, copy, url)
      say(`${seen.padEnd(8)} ${bug.name}`)
      if (seen !== 'caught') survived.push(bug)
    }
  } finally {
    await removeDatabase(database)
    rmSync(folder, { recursive: true, force: true })
  }
  say(`\n${chosen.length - survived.length} of ${chosen.length} planted bugs caught`)
  process.exit(survived.length > 0 ? 1 : 0)
})

async function makeCopy(copy) {
  const { output } = await run('git', ['ls-files', '-z'])
  for (const file of output.split('\0').filter(Boolean)) {
    mkdirSync(join(copy, dirname(file)), { recursive: true })
    cpSync(file, join(copy, file))
  }
  symlinkSync(resolve('node_modules'), join(copy, 'node_modules'))
}

/** 'caught' when the test named fails with the bug; it must have run, and its file must have loaded. */
async function plant({ file, find, put, project, test, named }, copy, databaseUrl) {
  const path = join(copy, file)
  const whole = readFileSync(path, 'utf8')
  if (whole.split(find).length !== 2) return 'moved'
  writeFileSync(
    path,
    whole.replace(find, () => put),
  )
  const report = join(copy, 'report.json')
  rmSync(report, { force: true })
  const args = ['run', '--project', project, test, '--reporter=json', `--outputFile.json=${report}`]
  if (named) args.push('-t', named.replaceAll(/[.*+?^${}()|[\]\\]/g, '\\$&'))
  await run(process.execPath, [resolve('node_modules/vitest/vitest.mjs'), ...args], {
    cwd: copy,
    env: { ...process.env, NODE_ENV: 'test', TEST_DATABASE_URL: databaseUrl, CI: '' },
    allowFailure: true,
  })
  writeFileSync(path, whole)
  const { testResults } = JSON.parse(readFileSync(report, 'utf8'))
  const asserted = testResults.flatMap(({ assertionResults }) => assertionResults)
  if (!asserted.some(({ status }) => status === 'passed' || status === 'failed')) return 'unrun'
  return asserted.some(({ status }) => status === 'failed') ? 'caught' : 'survived'
}
