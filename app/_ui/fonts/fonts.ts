import localFont from 'next/font/local'

// The latin files are needed for the first paint; the others are fetched when a letter in their range is on the page.
// next/font reads these calls as text: every value must be written out, no constants.

const figure = localFont({
  src: './archivo-latin.woff2',
  variable: '--face-figure',
  weight: '600 900',
  display: 'swap',
  declarations: [
    { prop: 'font-stretch', value: '62% 100%' },
    { prop: 'unicode-range', value: 'U+0000-00FF, U+2000-206F, U+20AC, U+2122, U+2190-2193, U+2212, U+2215, U+2248, U+2260, U+2264-2265' },
  ],
  adjustFontFallback: 'Arial',
})

const figureMore = localFont({
  src: './archivo-latin-ext.woff2',
  variable: '--face-figure-more',
  weight: '600 900',
  display: 'swap',
  preload: false,
  declarations: [
    { prop: 'font-stretch', value: '62% 100%' },
    { prop: 'unicode-range', value: 'U+0100-017F, U+0218-021B, U+02C6, U+02DA, U+02DC, U+1E80-1E85, U+1E9E, U+1EF2-1EF3' },
  ],
  adjustFontFallback: false,
})

const read = localFont({
  src: './atkinson-next-latin.woff2',
  variable: '--face-read',
  weight: '400 800',
  display: 'swap',
  declarations: [
    {
      prop: 'unicode-range',
      value: 'U+0000-00FF, U+03A9, U+03BC, U+2000-206F, U+20AC, U+2122, U+2190-2193, U+2212, U+2215, U+2248, U+2260, U+2264-2265',
    },
  ],
  adjustFontFallback: 'Arial',
})

const readMore = localFont({
  src: './atkinson-next-latin-ext.woff2',
  variable: '--face-read-more',
  weight: '400 800',
  display: 'swap',
  preload: false,
  declarations: [{ prop: 'unicode-range', value: 'U+0100-017F, U+0218-021B, U+02C6, U+02DA, U+02DC, U+1E80-1E85, U+1E9E, U+1EF2-1EF3' }],
  adjustFontFallback: false,
})

const code = localFont({
  src: './atkinson-mono-latin.woff2',
  variable: '--face-code',
  weight: '400 700',
  display: 'swap',
  preload: false,
  declarations: [
    {
      prop: 'unicode-range',
      value: 'U+0000-00FF, U+03A9, U+03BC, U+2000-206F, U+20AC, U+2122, U+2190-2193, U+2212, U+2215, U+2248, U+2260, U+2264-2265',
    },
  ],
  adjustFontFallback: false,
})

const codeMore = localFont({
  src: './atkinson-mono-latin-ext.woff2',
  variable: '--face-code-more',
  weight: '400 700',
  display: 'swap',
  preload: false,
  declarations: [{ prop: 'unicode-range', value: 'U+0100-017F, U+0218-021B, U+02C6, U+02DA, U+02DC, U+1E80-1E85, U+1E9E, U+1EF2-1EF3' }],
  adjustFontFallback: false,
})

/** The class names that declare the faces; they go on the root element once. */
export const fontVariables = [figure, figureMore, read, readMore, code, codeMore].map(({ variable }) => variable).join(' ')
