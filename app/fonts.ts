import localFont from 'next/font/local';

/*
 * One call per subset, since `unicode-range` belongs to a whole family here: a browser fetches the Greek or
 * the extended files only where a page needs such a letter. The two Latin romans are preloaded, no more. Only they
 * get a metric-adjusted fallback; it stands last in each stack (globals.css), so that it cannot shadow a subset.
 */

const hanken = localFont({
  src: '../node_modules/@fontsource-variable/hanken-grotesk/files/hanken-grotesk-latin-wght-normal.woff2',
  weight: '100 900',
  style: 'normal',
  variable: '--face-hanken',
  display: 'swap',
});

const hankenExtended = localFont({
  src: '../node_modules/@fontsource-variable/hanken-grotesk/files/hanken-grotesk-latin-ext-wght-normal.woff2',
  weight: '100 900',
  style: 'normal',
  variable: '--face-hanken-extended',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value: 'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+1E00-1E9F',
    },
  ],
});

const literata = localFont({
  src: [
    {
      path: '../node_modules/@fontsource-variable/literata/files/literata-latin-wght-normal.woff2',
      weight: '200 900',
      style: 'normal',
    },
  ],
  variable: '--face-literata',
  display: 'swap',
  adjustFontFallback: 'Times New Roman',
});

const literataItalic = localFont({
  src: [
    {
      path: '../node_modules/@fontsource-variable/literata/files/literata-latin-wght-italic.woff2',
      weight: '200 900',
      style: 'italic',
    },
  ],
  variable: '--face-literata-italic',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
});

const literataExtended = localFont({
  src: '../node_modules/@fontsource-variable/literata/files/literata-latin-ext-wght-normal.woff2',
  weight: '200 900',
  style: 'normal',
  variable: '--face-literata-extended',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value: 'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+1E00-1E9F',
    },
  ],
});

const literataGreek = localFont({
  src: [
    {
      path: '../node_modules/@fontsource-variable/literata/files/literata-greek-wght-normal.woff2',
      weight: '200 900',
      style: 'normal',
    },
    {
      path: '../node_modules/@fontsource-variable/literata/files/literata-greek-wght-italic.woff2',
      weight: '200 900',
      style: 'italic',
    },
  ],
  variable: '--face-literata-greek',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    { prop: 'unicode-range', value: 'U+0370-0377,U+037A-037F,U+0384-038A,U+038C,U+038E-03A1,U+03A3-03FF' },
  ],
});

/** Classes for <html>: they define the `--face-…` variables that globals.css builds its stacks from. */
export const fontClasses = [hanken, hankenExtended, literata, literataItalic, literataExtended, literataGreek]
  .map((font) => font.variable)
  .join(' ');
