import { readFileSync } from 'node:fs'

let known: string | undefined

/** Version of the program, from the package file beside it. */
export function programVersion(): string {
  known ??= (JSON.parse(readFileSync('package.json', 'utf8')) as { version: string }).version
  return known
}
