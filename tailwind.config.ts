import type { Config } from 'tailwindcss';

/** The tokens of app/globals.css, named by role. Space is set in 1, 2, 3, 4, 6, 8 and 12 units of 4 px. */
const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    colors: {
      inherit: 'inherit',
      current: 'currentColor',
      transparent: 'transparent',
      sheet: 'var(--sheet)',
      plate: 'var(--plate)',
      ink: 'var(--ink)',
      'ink-2': 'var(--ink-2)',
      rule: 'var(--rule)',
      hair: 'var(--hair)',
      guide: 'var(--guide)',
      act: 'var(--act)',
      'on-act': 'var(--on-act)',
      'act-wash': 'var(--act-wash)',
      refuse: 'var(--refuse)',
      'refuse-wash': 'var(--refuse-wash)',
      loss: { 1: 'var(--loss-1)', 2: 'var(--loss-2)', 3: 'var(--loss-3)', 4: 'var(--loss-4)' },
    },
    borderRadius: { none: '0px' },
    boxShadow: { none: 'none' },
    borderWidth: {
      0: '0px',
      DEFAULT: 'var(--pen-inside)',
      outline: 'var(--pen-outline)',
      edge: 'var(--pen-edge)',
      cursor: 'var(--pen-cursor)',
    },
    fontFamily: { text: 'var(--font-text)', title: 'var(--font-title)' },
    fontSize: {
      small: ['0.84375rem', { lineHeight: '1.125rem' }],
      label: ['0.9375rem', { lineHeight: '1.25rem' }],
      text: ['1rem', { lineHeight: '1.3125rem' }],
      lead: ['1.125rem', { lineHeight: '1.5rem' }],
      heading: ['1.25rem', { lineHeight: '1.5625rem', fontWeight: '660' }],
      verdict: ['clamp(1.125rem, 0.95rem + 0.75vw, 1.3125rem)', { lineHeight: '1.35' }],
      key: ['1.5625rem', { lineHeight: '1.875rem', fontWeight: '680' }],
      deviation: ['1.875rem', { lineHeight: '2.125rem' }],
      title: ['clamp(1.75rem, 1.35rem + 1.7vw, 2.375rem)', { lineHeight: '1.16', fontWeight: '620' }],
      graduation: ['2.5rem', { lineHeight: '1' }],
      score: ['clamp(2.5rem, 2rem + 2.5vw, 3.5rem)', { lineHeight: '1', fontWeight: '660' }],
      target: ['10.25rem', { lineHeight: '1' }],
    },
    extend: {
      spacing: { touch: '78px', bench: '18px', desk: '38px', inset: '14px' },
    },
  },
};

export default config;
