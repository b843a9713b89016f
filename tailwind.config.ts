import type { Config } from 'tailwindcss'

/** The values behind these names stand in app/globals.css, light and dark; tests/architecture/tokens.test.ts checks each pair. */
const config: Config = {
  content: [],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: 'var(--paper)',
      sheet: 'var(--sheet)',
      rule: 'var(--rule)',
      ink: 'var(--ink)',
      quiet: 'var(--quiet)',
      tide: 'var(--tide)',
      kelp: 'var(--kelp)',
      rust: 'var(--rust)',
      straw: 'var(--straw)',
    },
    fontFamily: {
      heading: 'var(--stack-heading)',
      text: 'var(--stack-text)',
      figures: 'var(--stack-figures)',
    },
    fontSize: {
      '13': ['0.8125rem', '1.25rem'],
      '15': ['0.9375rem', '1.5rem'],
      '17': ['1.0625rem', '1.625rem'],
      '21': ['1.3125rem', '1.75rem'],
      '28': ['1.75rem', '2.125rem'],
      '40': ['2.5rem', '2.75rem'],
    },
    borderRadius: { none: '0', DEFAULT: '2px' },
    boxShadow: { none: 'none' },
    screens: { sm: '40rem', md: '52rem', lg: '70rem' },
    extend: { maxWidth: { page: '70rem', words: '70ch' } },
  },
}
export default config
