import localFont from 'next/font/local'

// One call per script subset: next/font/local takes a unicode-range per call only. The loader reads these calls
// at build time, so every argument is a literal.

const heading = localFont({
  src: './familjen-grotesk/latin.woff2',
  weight: '400 700',
  display: 'swap',
  variable: '--face-heading',
  adjustFontFallback: 'Arial',
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0000-00FF, U+0131, U+0152-0153, U+02BB-02BC, U+02C6, U+02DA, U+02DC, U+0304, U+0308, U+0329, U+2000-206F, U+20AC, U+2122, U+2191, U+2193, U+2212, U+2215, U+FEFF, U+FFFD',
    },
  ],
})

const headingExt = localFont({
  src: './familjen-grotesk/latin-ext.woff2',
  weight: '400 700',
  display: 'swap',
  preload: false,
  variable: '--face-heading-ext',
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0100-02BA, U+02BD-02C5, U+02C7-02CC, U+02CE-02D7, U+02DD-02FF, U+0304, U+0308, U+0329, U+1D00-1DBF, U+1E00-1E9F, U+1EF2-1EFF, U+2020, U+20A0-20AB, U+20AD-20C0, U+2113, U+2C60-2C7F, U+A720-A7FF',
    },
  ],
})

const text = localFont({
  src: './atkinson-hyperlegible-next/latin.woff2',
  weight: '200 800',
  display: 'swap',
  variable: '--face-text',
  adjustFontFallback: 'Arial',
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0000-00FF, U+0131, U+0152-0153, U+02BB-02BC, U+02C6, U+02DA, U+02DC, U+0304, U+0308, U+0329, U+2000-206F, U+20AC, U+2122, U+2191, U+2193, U+2212, U+2215, U+FEFF, U+FFFD',
    },
  ],
})

const textExt = localFont({
  src: './atkinson-hyperlegible-next/latin-ext.woff2',
  weight: '200 800',
  display: 'swap',
  preload: false,
  variable: '--face-text-ext',
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0100-02BA, U+02BD-02C5, U+02C7-02CC, U+02CE-02D7, U+02DD-02FF, U+0304, U+0308, U+0329, U+1D00-1DBF, U+1E00-1E9F, U+1EF2-1EFF, U+2020, U+20A0-20AB, U+20AD-20C0, U+2113, U+2C60-2C7F, U+A720-A7FF',
    },
  ],
})

const figures = localFont({
  src: './martian-mono/latin.woff2',
  weight: '100 800',
  display: 'swap',
  variable: '--face-figures',
  adjustFontFallback: false,
  declarations: [
    { prop: 'font-stretch', value: '75% 112.5%' },
    {
      prop: 'unicode-range',
      value:
        'U+0000-00FF, U+0131, U+0152-0153, U+02BB-02BC, U+02C6, U+02DA, U+02DC, U+0304, U+0308, U+0329, U+2000-206F, U+20AC, U+2122, U+2191, U+2193, U+2212, U+2215, U+FEFF, U+FFFD',
    },
  ],
})

const figuresExt = localFont({
  src: './martian-mono/latin-ext.woff2',
  weight: '100 800',
  display: 'swap',
  preload: false,
  variable: '--face-figures-ext',
  adjustFontFallback: false,
  declarations: [
    { prop: 'font-stretch', value: '75% 112.5%' },
    {
      prop: 'unicode-range',
      value:
        'U+0100-02BA, U+02BD-02C5, U+02C7-02CC, U+02CE-02D7, U+02DD-02FF, U+0304, U+0308, U+0329, U+1D00-1DBF, U+1E00-1E9F, U+1EF2-1EFF, U+2020, U+20A0-20AB, U+20AD-20C0, U+2113, U+2C60-2C7F, U+A720-A7FF',
    },
  ],
})

/** Class names for `<html>`: they only define the variables that globals.css builds its three stacks from. */
export const faces = [heading, headingExt, text, textExt, figures, figuresExt]
  .map((face) => face.variable)
  .join(' ')
