import { basename } from 'node:path'
import { expect, test } from 'vitest'
import { readSources, type Source } from './source'

const sources = readSources()
const own = sources.filter(({ file }) => !file.startsWith('tests/'))
const filesOf = (found: readonly Source[]) => found.map(({ file }) => file)
const withoutComments = (text: string) =>
  text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/(^|\s)\/\/.*$/gm, '$1')

test('models have no hooks, default scopes, soft deletes or computing getters', () => {
  const forbidden =
    /\bhooks\s*:|\baddHook\(|\.(before|after)[A-Z]\w+\(|\bdefaultScope\b|\bparanoid\b|\bget\s+\w+\(\)|\bget\(\)\s*\{/
  const models = own.filter(({ file }) => file.startsWith('models/'))
  expect(filesOf(models.filter(({ text }) => forbidden.test(withoutComments(text))))).toEqual([])
})

test('the environment is read in one place', () => {
  // Scripts hand their whole environment to a child; NEXT_RUNTIME is the framework's word at build time.
  const reads = /process\.env(?!\.NEXT_RUNTIME\b)/
  const readers = own.filter(
    ({ file, text }) => !file.startsWith('scripts/') && reads.test(withoutComments(text)),
  )
  expect(filesOf(readers).filter((file) => !/^(vitest|playwright)\.config\.ts$/.test(file))).toEqual([
    'lib/config/env.ts',
  ])
})

test('no role is compared outside lib/core/policy', () => {
  const compares = /\brole\w*\s*[!=]==?|\.role\w*\.includes\(|[!=]==?\s*'packer'|case '(owner|packer)'/i
  const allowed = /^(lib\/core\/policy|migrations|seeders|scripts)\//
  const guilty = own.filter(({ file, text }) => !allowed.test(file) && compares.test(withoutComments(text)))
  expect(filesOf(guilty)).toEqual([])
})

test('no test mocks a file of ours or can be skipped', () => {
  const tests = sources.filter(
    ({ file }) => file.startsWith('tests/') && !file.startsWith('tests/architecture/'),
  )
  const wrong = /vi\.mock\(\s*['"][@.]|\b(test|it|describe)\.(only|skip|todo)\(/
  expect(filesOf(tests.filter(({ text }) => wrong.test(text)))).toEqual([])
})

test('files are named in kebab-case after what they do, and there is one barrel', () => {
  const names = sources.filter(({ file }) => !file.startsWith('app/') && !file.startsWith('migrations/'))
  const odd = names.filter(({ file }) => !/^[a-z0-9-]+(\.(test|spec|config|d))?\.tsx?$/.test(basename(file)))
  expect(filesOf(odd).filter((file) => !basename(file).startsWith('_'))).toEqual([])
  const drawers = names.filter(({ file }) =>
    /\/((utils|helpers|common|misc)(\.tsx?|\/)|(process|handle|manage)-)/.test(file),
  )
  expect(filesOf(drawers)).toEqual([])
  const barrels = own.filter(({ text }) => {
    const lines = withoutComments(text)
      .split('\n')
      .filter((line) => line.trim() && !line.includes("'server-only'"))
    return lines.length > 1 && lines.every((line) => /^export (type )?(\*|\{.*\}) from /.test(line))
  })
  expect(filesOf(barrels).filter((file) => file !== 'models/index.ts')).toEqual([])
})

test('what is put off has an issue', () => {
  const open = sources.filter(
    ({ file, text }) => !file.startsWith('tests/architecture/') && /\bTODO\b(?!\(#\d+\))/.test(text),
  )
  expect(filesOf(open)).toEqual([])
})

/** Route files over sixty lines, each with its reason. */
const LONG_ROUTES: Readonly<Record<string, string>> = {}

test('files stay short', () => {
  const counted = own.filter(
    ({ file }) => !file.startsWith('lib/core/data/') && !file.startsWith('migrations/'),
  )
  const sizes = counted
    .map(({ file, text }) => ({ file, lines: text.split('\n').length - 1 }))
    .sort((a, b) => a.lines - b.lines)
  const at = (share: number) => sizes[Math.floor(sizes.length * share)]?.lines ?? 0
  const longest = sizes
    .slice(-5)
    .reverse()
    .map(({ file, lines }) => `${lines} ${file}`)
  process.stdout.write(
    `${sizes.length} files, lines: median ${at(0.5)}, p90 ${at(0.9)}; longest: ${longest.join(', ')}\n`,
  )
  expect(at(0.9)).toBeLessThan(120)
  const longRoutes = sizes.filter(({ file, lines }) => /^app\/.*\/route\.tsx?$/.test(file) && lines > 60)
  expect(longRoutes.map(({ file }) => file)).toEqual(Object.keys(LONG_ROUTES))
})
