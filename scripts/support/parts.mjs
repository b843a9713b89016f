import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { run, say } from './shell.mjs'

const RESULTS = join('.data', 'test-results')
const node = (path) => [process.execPath, join('node_modules', path)]
const TOOLS = {
  next: node('next/dist/bin/next'),
  tsc: node('typescript/bin/tsc'),
  eslint: node('eslint/bin/eslint.js'),
  vitest: node('vitest/vitest.mjs'),
  playwright: node('@playwright/test/cli.js'),
}

/** Runs one part of the tests, says how it went and how long it took, and gives back its counts. */
export async function runPart(name, body) {
  const began = performance.now()
  const { passed, failed, output } = await body().catch((error) => ({
    passed: 0,
    failed: 1,
    output: error.message,
  }))
  const seconds = ((performance.now() - began) / 1000).toFixed(1)
  if (failed > 0) say(`\n--- ${name}\n${tail(output)}\n---`)
  say(
    `${name.padEnd(12)} ${String(passed).padStart(5)} passed ${String(failed).padStart(4)} failed  ${seconds.padStart(6)} s`,
  )
  return { name, passed, failed, seconds: Number(seconds) }
}

/** A tool that says yes or no: one check. */
export async function runTool(tool, args, env = {}) {
  const [command, script] = TOOLS[tool]
  const { code, output } = await run(command, [script, ...args], {
    allowFailure: true,
    env: { ...process.env, NO_COLOR: '1', FORCE_COLOR: '0', ...env },
  })
  return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, output }
}

export async function runTypes() {
  const made = await runTool('next', ['typegen'])
  return made.failed ? made : runTool('tsc', ['--noEmit'])
}

/** Counts from vitest's own report; a file that could not be loaded, or an error between tests, is a failure. */
export async function runVitest(projects, env = {}) {
  const file = freshReport(projects.join('-'))
  const args = [
    'run',
    ...projects.flatMap((name) => ['--project', name]),
    '--reporter=default',
    '--reporter=json',
  ]
  const { failed, output } = await runTool('vitest', [...args, `--outputFile.json=${file}`], env)
  if (!existsSync(file)) return { passed: 0, failed: 1, output }
  const report = JSON.parse(readFileSync(file, 'utf8'))
  const unread = report.testResults.filter(
    ({ status, assertionResults }) =>
      status === 'failed' && assertionResults.every((each) => each.status !== 'failed'),
  )
  const found = report.numFailedTests + unread.length
  return { passed: report.numPassedTests, failed: Math.max(found, failed), output }
}

/** Counts from Playwright's own report. One that passed on its second try counts, and is named: it wants looking at. */
export async function runPlaywright(args, env = {}) {
  const file = freshReport('browser')
  const { failed, output } = await runTool('playwright', ['test', ...args], {
    ...env,
    PLAYWRIGHT_JSON_OUTPUT_NAME: file,
  })
  if (!existsSync(file)) return { passed: 0, failed: 1, output }
  const { stats, errors } = JSON.parse(readFileSync(file, 'utf8'))
  if (stats.flaky > 0) say(`${stats.flaky} browser tests passed on the second try only; see ${file}.`)
  const found = stats.unexpected + errors.length
  return { passed: stats.expected + stats.flaky, failed: Math.max(found, failed), output }
}

function freshReport(name) {
  mkdirSync(RESULTS, { recursive: true })
  const file = join(RESULTS, `${name}.json`)
  rmSync(file, { force: true })
  return file
}

function tail(output) {
  const lines = output
    .trim()
    .split('\n')
    .filter((line) => !/^\s*✓/.test(line))
  return lines.length > 150
    ? `… ${lines.length - 150} lines before\n${lines.slice(-150).join('\n')}`
    : lines.join('\n')
}
