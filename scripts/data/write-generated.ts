import { writeFileSync } from 'node:fs'
import { resolve } from 'node:path'
import { fileURLToPath } from 'node:url'

/** Writes a generated file when its script is the one that was started; an import by a test writes nothing. */
export function writeGenerated(scriptUrl: string, path: string, source: () => string): void {
  const started = process.argv[1]
  if (started !== undefined && resolve(started) === fileURLToPath(scriptUrl)) {
    writeFileSync(fileURLToPath(new URL(`../../${path}`, import.meta.url)), source())
  }
}
