import { readdirSync, readFileSync } from 'node:fs'
import { join, relative } from 'node:path'
import { pathToFileURL } from 'node:url'
import ts from 'typescript'
import { describe, expect, test } from 'vitest'

const root = join(import.meta.dirname, '../..')

type Export = { name: string; documented: boolean; examples: string[] }

function exportsOf(path: string): Export[] {
  const source = ts.createSourceFile(path, readFileSync(path, 'utf8'), ts.ScriptTarget.Latest, true)
  const found: Export[] = []
  for (const statement of source.statements) {
    if (
      ts.isExportDeclaration(statement) &&
      statement.exportClause &&
      ts.isNamedExports(statement.exportClause)
    ) {
      // Passed on from another file of the core, which holds the docstring.
      for (const { name } of statement.exportClause.elements) {
        found.push({ name: name.text, documented: true, examples: [] })
      }
    }
    const exported =
      ts.canHaveModifiers(statement) &&
      ts.getModifiers(statement)?.some((each) => each.kind === ts.SyntaxKind.ExportKeyword)
    if (!exported) continue
    const doc = ts
      .getJSDocCommentsAndTags(statement)
      .map((each) => each.getText(source))
      .join('\n')
    const names = ts.isVariableStatement(statement)
      ? statement.declarationList.declarations.map((each) => each.name.getText(source))
      : [(statement as ts.DeclarationStatement).name?.getText(source) ?? 'default']
    for (const name of names) found.push({ name, documented: hasSentence(doc), examples: examplesOf(doc) })
  }
  return withoutUndocumentedOverloads(found)
}

/** An implementation behind documented overloads needs no docstring of its own. */
function withoutUndocumentedOverloads(found: Export[]): Export[] {
  return found.filter(
    ({ name, documented }) => documented || !found.some((e) => e.name === name && e.documented),
  )
}

const linesOf = (doc: string) => doc.split('\n').map((line) => line.replace(/^\s*(\/\*\*|\*\/|\*)?\s?/, ''))

function hasSentence(doc: string): boolean {
  return linesOf(doc).some((line) => !line.startsWith('@') && /[a-z]{2}/i.test(line.replace('*/', '')))
}

function examplesOf(doc: string): string[] {
  return linesOf(doc)
    .filter((line) => line.startsWith('@example'))
    .map((line) => line.slice('@example'.length).replace('*/', '').trim())
}

/** `expression  // → value`, where value is a literal, `ok(…)`, `refuse('…')` or an approximate number `≈ 0.1438`. */
function split(example: string): { expression: string; value: string; approximate: boolean } | null {
  const at = example.search(/\/\/\s*(→|≈)/)
  if (at < 0) return null
  const value = example.slice(at).replace(/^\/\/\s*(→\s*)?/, '')
  return {
    expression: example.slice(0, at).trim(),
    value: value.replace(/^≈\s*/, '').trim(),
    approximate: value.startsWith('≈'),
  }
}

function evaluate(expression: string, scope: Record<string, unknown>): unknown {
  return compile(expression, Object.keys(scope))(...Object.values(scope))
}

/** An example may hold types, but few do, and stripping them takes time. */
function compile(expression: string, names: readonly string[]): (...values: unknown[]) => unknown {
  try {
    return new Function(...names, `return (${expression})`) as (...values: unknown[]) => unknown
  } catch {
    const javascript = ts.transpile(`const example = (${expression})`, { target: ts.ScriptTarget.ES2023 })
    return new Function(...names, `${javascript}\nreturn example`) as (...values: unknown[]) => unknown
  }
}

const load = (path: string) => import(pathToFileURL(path).href) as Promise<Record<string, unknown>>

/** Every export of the core by its name, so that an example may build its arguments with a neighbour's function. */
async function loadNeighbours(): Promise<Record<string, unknown>> {
  const loaded = await Promise.allSettled(files.map(load))
  return Object.assign({}, ...loaded.map((each) => (each.status === 'fulfilled' ? each.value : {})))
}

/** One unit in the last digit that the example prints, but never finer than a double carries. */
function toleranceOf(printed: string): number {
  return Math.max(lastDigitOf(printed), Math.abs(Number(printed)) * 1e-14)
}

function lastDigitOf(printed: string): number {
  const [mantissa = '', power = '0'] = printed.toLowerCase().split('e')
  return 10 ** (Number(power) - (mantissa.split('.')[1]?.length ?? 0))
}

const plain = (value: unknown): unknown =>
  ArrayBuffer.isView(value) ? Array.from(value as Float64Array) : Object.is(value, -0) ? 0 : value

const files = readdirSync(join(root, 'lib/core'), { recursive: true, encoding: 'utf8' })
  .filter((path) => path.endsWith('.ts'))
  .map((path) => join(root, 'lib/core', path))
  .sort()

const neighbours = loadNeighbours()

describe('docstrings of lib/core', () => {
  test('there is a core to look at', () => {
    expect(files.length).toBeGreaterThan(40)
  })

  test.each(files.map((path) => [relative(root, path), path]))(
    '%s',
    async (_, path) => {
      const exported = exportsOf(path)
      const bare = exported.filter((each) => !each.documented).map((each) => each.name)
      expect(bare, 'exports without a docstring').toEqual([])

      const examples = exported.flatMap((each) => each.examples)
      if (examples.length === 0) return
      const scope = { ...(await neighbours), ...(await load(path)) }
      for (const example of examples) {
        const parts = split(example)
        if (parts === null) throw new Error(`an example reads "expression  // → value": ${example}`)
        const actual = evaluate(parts.expression, scope)
        const expected = evaluate(parts.value, scope)
        if (parts.approximate) {
          expect(
            Math.abs(Number(actual) - Number(expected)),
            `${example} (is ${actual})`,
          ).toBeLessThanOrEqual(toleranceOf(parts.value))
        } else {
          expect(plain(actual), example).toEqual(plain(expected))
        }
      }
      // The first loads the whole core.
    },
    60_000,
  )
})

describe('the index in lib/core/README.md', () => {
  const rows = readFileSync(join(root, 'lib/core/README.md'), 'utf8')
    .split('\n')
    .map((line) => line.split('|').map((cell) => cell.trim()))
    .filter((cells) => /^`\w+`/.test(cells[3] ?? ''))

  test('has a row for every word of the trade', () => {
    expect(rows.length).toBeGreaterThan(50)
  })

  test.each(rows.map((cells): [string, string, string] => [cells[1]!, cells[3]!, cells[4]!]))(
    '%s: %s',
    (_, names, paths) => {
      const exported = paths.split(', ').flatMap((path) => exportsOf(join(root, 'lib/core', path)))
      const missing = [...names.matchAll(/`(\w+)`/g)].filter(
        ([, name]) => !exported.some((each) => each.name === name),
      )
      expect(missing.map(([, name]) => name)).toEqual([])
    },
  )
})

describe('the reader of docstrings itself', () => {
  test('sees an approximate value and its last digit', () => {
    expect(split('f(1)  // → ≈ 0.14')).toEqual({ expression: 'f(1)', value: '0.14', approximate: true })
    expect(lastDigitOf('0.14')).toBeCloseTo(0.01, 12)
    expect(lastDigitOf('1.5e-3')).toBeCloseTo(1e-4, 12)
  })

  test('does not take a line without an arrow for an example', () => {
    expect(split('f(1) is 2')).toBeNull()
  })

  test('does not take a tag for a sentence', () => {
    expect(hasSentence('/**\n * @example f(1)  // → 2\n */')).toBe(false)
    expect(hasSentence('/** Whether it floats. */')).toBe(true)
  })
})
