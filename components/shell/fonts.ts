import localFont from 'next/font/local';

const archivo = localFont({
  src: '../../public/fonts/archivo-latin.woff2',
  variable: '--font-archivo',
  weight: '100 900',
  declarations: [{ prop: 'font-stretch', value: '62% 125%' }],
  fallback: ['system-ui', 'sans-serif'],
});

const archivoExtended = localFont({
  src: '../../public/fonts/archivo-latin-ext.woff2',
  variable: '--font-archivo-extended',
  weight: '100 900',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    { prop: 'font-stretch', value: '62% 125%' },
    {
      prop: 'unicode-range',
      value:
        'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+1D00-1DBF,U+1E00-1E9F,U+20A0-20C0',
    },
  ],
});

const archivoVietnamese = localFont({
  src: '../../public/fonts/archivo-vietnamese.woff2',
  variable: '--font-archivo-vietnamese',
  weight: '100 900',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    { prop: 'font-stretch', value: '62% 125%' },
    {
      prop: 'unicode-range',
      value: 'U+0102-0103,U+0110-0111,U+0128-0129,U+0168-0169,U+01A0-01A1,U+01AF-01B0,U+1EA0-1EF9,U+20AB',
    },
  ],
});

const besley = localFont({
  src: '../../public/fonts/besley-latin.woff2',
  variable: '--font-besley',
  weight: '400 900',
  fallback: ['Georgia', 'serif'],
});

const besleyExtended = localFont({
  src: '../../public/fonts/besley-latin-ext.woff2',
  variable: '--font-besley-extended',
  weight: '400 900',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+1D00-1DBF,U+1E00-1E9F,U+20A0-20C0',
    },
  ],
});

/** Class names that define the font variables; they go on the html element. */
export const fontVariables = [archivo, archivoExtended, archivoVietnamese, besley, besleyExtended]
  .map((font) => font.variable)
  .join(' ');
