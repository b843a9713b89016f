import { readdirSync, readFileSync, statSync } from 'node:fs'
import { join, relative } from 'node:path'

/** One address of the application with one method; a page is asked for with GET. */
export type Route = { key: string; method: string; path: string; file: string; isPage: boolean }

const METHOD = /export (?:async function|const|function) (GET|HEAD|POST|PUT|PATCH|DELETE)\b/g
const RENAMED = /export \{([^}]*)\}/g

/** Every address there is, read from the route files themselves, so that none can be forgotten. */
export function listRoutes(): Route[] {
  return filesUnder('app')
    .filter((file) => /\/(page\.tsx|route\.tsx?)$/.test(file) || file === 'app/page.tsx')
    .flatMap((file) => {
      const path = pathOf(file)
      const isPage = file.endsWith('page.tsx')
      const methods = isPage ? ['PAGE'] : methodsOf(readFileSync(file, 'utf8'))
      return methods.map((method) => ({ key: `${method} ${path}`, method, path, file, isPage }))
    })
    .sort((a, b) => a.key.localeCompare(b.key))
}

function pathOf(file: string): string {
  const parts = relative('app', file).split('/').slice(0, -1)
  return `/${parts.filter((part) => !part.startsWith('(')).join('/')}`
}

function methodsOf(text: string): string[] {
  const named = [...text.matchAll(METHOD)].map(([, method]) => method!)
  const renamed = [...text.matchAll(RENAMED)].flatMap(([, list]) =>
    [...list!.matchAll(/\b(GET|HEAD|POST|PUT|PATCH|DELETE)\b(?!\s+as)/g)].map(([, method]) => method!),
  )
  return [...new Set([...named, ...renamed])]
}

function filesUnder(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name)
    return statSync(path).isDirectory() ? filesUnder(path) : [path]
  })
}
