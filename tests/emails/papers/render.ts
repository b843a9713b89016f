import { execFileSync } from 'node:child_process'
import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

/** Runs `look` with the paper as a file in a folder of its own. */
function withFile<T>(pdf: Buffer, look: (file: string, folder: string) => T): T {
  const folder = mkdtempSync(join(tmpdir(), 'paper-'))
  try {
    const file = join(folder, 'paper.pdf')
    writeFileSync(file, pdf)
    return look(file, folder)
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}

/** The text of each sheet as another program reads it. */
export const textsOf = (pdf: Buffer): string[] =>
  withFile(pdf, (file) =>
    execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' }).split('\f').slice(0, -1),
  )

/** The bar codes of each sheet as an independent decoder reads its picture. */
export const codesOf = (pdf: Buffer): string[][] =>
  withFile(pdf, (file, folder) => {
    execFileSync('pdftoppm', ['-r', '200', '-png', file, join(folder, 'sheet')])
    return readdirSync(folder)
      .filter((name) => name.endsWith('.png'))
      .sort()
      .map((name) => decode(join(folder, name)))
  })

function decode(picture: string): string[] {
  try {
    const read = execFileSync('zbarimg', ['--quiet', '--raw', picture], {
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'ignore'],
    })
    return read.trim().split('\n').sort()
  } catch (error) {
    // The decoder's exit code 4 says that there was no code on the picture.
    if ((error as { status?: number }).status === 4) return []
    throw error
  }
}
