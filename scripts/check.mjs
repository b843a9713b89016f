import { existsSync } from 'node:fs'
import { resolve } from 'node:path'
import { ensureModules } from './support/modules.mjs'
import { runPart, runTool, runTypes, runVitest } from './support/parts.mjs'
import { main, say } from './support/shell.mjs'

const CACHED_LINT = [
  '.',
  '--max-warnings',
  '0',
  '--cache',
  '--cache-location',
  '.cache/eslint',
  '--cache-strategy',
  'content',
]

/** Types, lint and everything that needs no database, side by side. */
export function runCheck({ isFull = false } = {}) {
  // With the types of everything at hand, a kept result for an unchanged file may be wrong.
  const lint = isFull ? CACHED_LINT.slice(0, 3) : CACHED_LINT
  const plain = ['unit', ...(existsSync('tests/ui') ? ['ui'] : [])]
  return Promise.all([
    runPart('types', runTypes),
    runPart('lint', () => runTool('eslint', lint, isFull ? { LINT: 'full' } : {})),
    runPart('unit', () => runVitest(plain)),
  ])
}

if (process.argv[1] && resolve(process.argv[1]) === import.meta.filename) {
  main(async () => {
    process.chdir(resolve(import.meta.dirname, '..'))
    await ensureModules()
    const parts = await runCheck()
    const failed = parts.reduce((sum, part) => sum + part.failed, 0)
    say(`${parts.reduce((sum, part) => sum + part.passed, 0)} passed, ${failed} failed`)
    process.exitCode = failed > 0 ? 1 : 0
  })
}
