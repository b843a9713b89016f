import { readdirSync, readFileSync } from 'node:fs'
import { expect, test } from 'vitest'

function paths(folder: string, ends: RegExp): string[] {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .map((path) => `${folder}/${path}`)
    .filter((path) => ends.test(path))
}
const files = (folder: string, ends: RegExp) =>
  paths(folder, ends).map((path) => [path, readFileSync(path, 'utf8')] as const)

test('no component carries a style attribute: the content policy would drop it', () => {
  const offenders = [...files('app', /\.tsx$/), ...files('components', /\.tsx$/)].filter(([, text]) =>
    /\sstyle=\{/.test(text),
  )
  expect(offenders.map(([path]) => path)).toEqual([])
})

test('components/ui knows no word of the trade', () => {
  const words = /\b(workshops?|deposits?|parcels?|offers?|sign-?ups?|modules?|withdrawals?|invitations?)\b/i
  const ui = files('components/ui', /\.tsx?$/)
  expect(ui.length).toBeGreaterThan(20)
  expect(ui.filter(([, text]) => words.test(text)).map(([path]) => path)).toEqual([])
})

test('every face has its licence beside it', () => {
  const folders = new Set(paths('fonts', /\.(woff2|ttf)$/).map((path) => path.replace(/\/[^/]+$/, '')))
  expect(folders.size).toBe(4)
  for (const folder of folders)
    expect(readFileSync(`${folder}/LICENSE`, 'utf8')).toContain('Open Font License')
})
