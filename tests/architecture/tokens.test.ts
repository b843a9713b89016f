import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'

const css = readFileSync(new URL('../../app/globals.css', import.meta.url), 'utf8')
const tokens = new Map<string, { light: string; dark: string }>()
for (const [, name, light, dark] of css.matchAll(
  /--([a-z]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g,
)) {
  tokens.set(name!, { light: light!, dark: dark! })
}

/** Relative luminance and contrast ratio: WCAG 2.2, definitions of those names. */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const c = parseInt(hex.slice(at, at + 2), 16) / 255
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r! + 0.7152 * g! + 0.0722 * b!
}
function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x)
  return (light! + 0.05) / (dark! + 0.05)
}

// Known values: black on white is 21:1; #767676 on white is the well-known grey just above 4.5:1 (from memory).
test('the ratio is the one of WCAG', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10)
  expect(contrast('#767676', '#ffffff')).toBeGreaterThan(4.5)
  expect(contrast('#777777', '#ffffff')).toBeLessThan(4.5)
})

test('all nine colours are there, light and dark', () => {
  expect([...tokens.keys()].sort()).toEqual([
    'ink',
    'kelp',
    'paper',
    'quiet',
    'rule',
    'rust',
    'sheet',
    'straw',
    'tide',
  ])
})

const themes = ['light', 'dark'] as const
const words = ['ink', 'quiet', 'tide', 'kelp', 'rust', 'straw']
const grounds = ['paper', 'sheet']
const pairs = themes.flatMap((theme) =>
  words.flatMap((word) => grounds.map((ground) => [theme, word, ground] as const)),
)

test.each(pairs)('%s: %s reads on %s', (theme, word, ground) => {
  expect(contrast(tokens.get(word)![theme], tokens.get(ground)![theme])).toBeGreaterThanOrEqual(4.5)
})

// Buttons: paper on tide, rust and (under the pointer) ink.
test.each(themes.flatMap((theme) => ['tide', 'rust', 'ink'].map((ground) => [theme, ground] as const)))(
  '%s: a button’s words read on %s',
  (theme, ground) => {
    expect(contrast(tokens.get('paper')![theme], tokens.get(ground)![theme])).toBeGreaterThanOrEqual(4.5)
  },
)

// What must be seen but not read: frames of fields and axes (quiet), focus (tide), fills (tide against the empty tube).
test.each(
  themes.flatMap((theme) =>
    ['quiet', 'tide', 'ink'].flatMap((line) => grounds.map((g) => [theme, line, g] as const)),
  ),
)('%s: a line in %s is seen on %s', (theme, line, ground) => {
  expect(contrast(tokens.get(line)![theme], tokens.get(ground)![theme])).toBeGreaterThanOrEqual(3)
})
