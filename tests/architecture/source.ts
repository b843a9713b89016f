import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs'
import { dirname, join, normalize } from 'node:path'
import { ARROWS } from './arrows'

/** `target` is a file of ours, or the name of a package when `isPackage`. */
export type Import = { target: string; isPackage: boolean; isType: boolean }
export type Source = { file: string; text: string; part: string | null; imports: readonly Import[] }

const FOLDERS = [
  'app',
  'components',
  'emails',
  'fonts',
  'lib',
  'migrations',
  'models',
  'scripts',
  'seeders',
  'tests',
]
const ENDINGS = ['', '.ts', '.tsx', '.mts', '.d.mts', '/index.ts', '/index.tsx']
const STATEMENT = /(?:^|\n)[ \t]*(import|export)\s+(type\s+)?((?:[\w*{][^'";]*?\sfrom\s+)?)['"]([^'"]+)['"]/g
const CALL = /\b(?:import|require)\(\s*['"]([^'"]+)['"]\s*\)/g

/** Every TypeScript file of ours with what it imports. */
export function readSources(): Source[] {
  const top = readdirSync('.').filter((name) => /^[\w.-]+\.ts$/.test(name) && name !== 'next-env.d.ts')
  return [...FOLDERS.flatMap(filesUnder), ...top].filter((file) => /\.tsx?$/.test(file)).map(readSource)
}

function readSource(file: string): Source {
  const text = readFileSync(file, 'utf8')
  const code = text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/(^|\s)\/\/.*$/gm, '$1')
  const statements = [...code.matchAll(STATEMENT)].map(([, , type, names = '', from = '']) =>
    importOf(file, from, Boolean(type) || isAllTypes(names)),
  )
  // `import('…')` may also stand in a type, where nothing is loaded; it is counted all the same.
  const calls = [...code.matchAll(CALL)].map(([, from = '']) => importOf(file, from, false))
  return { file, text, part: partOf(file), imports: [...statements, ...calls] }
}

/** `{ type A, type B } from` loads nothing. */
function isAllTypes(names: string): boolean {
  const inside = /^\{([\s\S]*)\}/.exec(names.trim())?.[1]
  const list =
    inside
      ?.split(',')
      .map((name) => name.trim())
      .filter(Boolean) ?? []
  return list.length > 0 && list.every((name) => name.startsWith('type '))
}

function importOf(file: string, from: string, isType: boolean): Import {
  const path = from.startsWith('@/')
    ? from.slice(2)
    : from.startsWith('.')
      ? normalize(join(dirname(file), from))
      : null
  if (path === null) return { target: from, isPackage: true, isType }
  const found = ENDINGS.map((ending) => path + ending).find(
    (name) => existsSync(name) && statSync(name).isFile(),
  )
  return { target: found ?? path, isPackage: false, isType }
}

/** The part of the house a file stands in; null for scripts, tests and the framework's files. */
export function partOf(file: string): string | null {
  const parts = Object.keys(ARROWS).filter((part) => file === `${part}.ts` || file.startsWith(`${part}/`))
  return parts.sort((a, b) => b.length - a.length)[0] ?? null
}

function filesUnder(folder: string): string[] {
  if (!existsSync(folder)) return []
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name)
    return statSync(path).isDirectory() ? filesUnder(path) : [path]
  })
}
