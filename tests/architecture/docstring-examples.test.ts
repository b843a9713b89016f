import { readdirSync, readFileSync } from 'node:fs'
import { join, relative } from 'node:path'
import { pathToFileURL } from 'node:url'
import ts from 'typescript'
import { describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { ok, refuse } from '@/lib/core/result'

const root = join(import.meta.dirname, '../..')

type Export = { name: string; documented: boolean; examples: string[] }

function exportsOf(path: string): Export[] {
  const source = ts.createSourceFile(path, readFileSync(path, 'utf8'), ts.ScriptTarget.Latest, true)
  const found: Export[] = []
  for (const statement of source.statements) {
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
  return new Function(...Object.keys(scope), `'use strict'; return (${expression})`)(...Object.values(scope))
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

describe('docstrings of lib/core', () => {
  test('there is a core to look at', () => {
    expect(files.length).toBeGreaterThan(40)
  })

  test.each(files.map((path) => [relative(root, path), path]))('%s', async (_, path) => {
    const exported = exportsOf(path)
    const bare = exported.filter((each) => !each.documented).map((each) => each.name)
    expect(bare, 'exports without a docstring').toEqual([])

    const examples = exported.flatMap((each) => each.examples)
    if (examples.length === 0) return
    const scope = {
      ok,
      refuse,
      minor,
      ...((await import(pathToFileURL(path).href)) as Record<string, unknown>),
    }
    for (const example of examples) {
      const parts = split(example)
      if (parts === null) throw new Error(`an example reads "expression  // → value": ${example}`)
      const actual = evaluate(parts.expression, scope)
      const expected = evaluate(parts.value, scope)
      if (parts.approximate) {
        expect(Math.abs(Number(actual) - Number(expected)), `${example} (is ${actual})`).toBeLessThanOrEqual(
          toleranceOf(parts.value),
        )
      } else {
        expect(plain(actual), example).toEqual(plain(expected))
      }
    }
  })
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
