/** The tokens of the look, as literal values: mail readers know no variables. */
export const light = {
  paper: '#F4F1EA',
  sheet: '#FBF9F4',
  rule: '#CFC8BA',
  ink: '#17232B',
  quiet: '#55626B',
  tide: '#0B5563',
} as const

export const dark = {
  paper: '#12181B',
  sheet: '#182024',
  rule: '#34424A',
  ink: '#E9E4D8',
  quiet: '#A3AFB5',
  tide: '#6FC3CF',
} as const

/** Nothing is fetched: the fonts are those a reader has. */
export const sans =
  "'Atkinson Hyperlegible Next', 'Atkinson Hyperlegible', Verdana, 'DejaVu Sans', Arial, sans-serif"
export const mono = "'Martian Mono', 'DejaVu Sans Mono', Consolas, Menlo, monospace"

export const ink = { color: light.ink, fontSize: 16, lineHeight: '24px' }

const rules = (scope: string) => `
${scope}.paper { background-color: ${dark.paper} !important; }
${scope}.sheet { background-color: ${dark.sheet} !important; border-color: ${dark.quiet} !important; }
${scope}.edge { border-color: ${dark.quiet} !important; }
${scope}.rule { border-color: ${dark.rule} !important; }
${scope}.ink { color: ${dark.ink} !important; }
${scope}.quiet { color: ${dark.quiet} !important; }
${scope}.tide { color: ${dark.tide} !important; }
${scope}.button { background-color: ${dark.tide} !important; color: ${dark.paper} !important; }`

/** Dark colours where the reader asks the system, and where it sets `data-ogsc` on what it recolours itself. */
export const DARK_SHEET = `@media (prefers-color-scheme: dark) {${rules('')}
}${rules('[data-ogsc] ')}
a { overflow-wrap: anywhere; }`
