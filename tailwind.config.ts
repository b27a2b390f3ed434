import type { Config } from 'tailwindcss';

/** The tokens themselves stand in src/styles/tokens.css; here they become utilities. */
export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-theme="dark"]'],
  theme: {
    extend: {
      colors: {
        bench: 'var(--bench)',
        paper: 'var(--paper)',
        tray: 'var(--tray)',
        ink: { DEFAULT: 'var(--ink)', 2: 'var(--ink-2)' },
        hair: 'var(--hair)',
        edge: 'var(--edge)',
        bottle: { DEFAULT: 'var(--bottle)', on: 'var(--on-bottle)' },
        lit: 'var(--lit)',
        amber: { DEFAULT: 'var(--amber)', wash: 'var(--amber-wash)' },
        stop: { DEFAULT: 'var(--stop)', wash: 'var(--stop-wash)' },
        glass: { DEFAULT: 'var(--glass)', 2: 'var(--glass-2)', ink: 'var(--glass-ink)', ink2: 'var(--glass-ink-2)', edge: 'var(--glass-edge)' },
        slip: { DEFAULT: 'var(--slip)', ink: 'var(--slip-ink)' },
      },
      fontFamily: { sans: ['IBM Plex Sans', 'sans-serif'] },
      fontSize: {
        12: ['12px', '16px'],
        13: ['13px', '20px'],
        15: ['15px', '24px'],
        18: ['18px', '24px'],
        24: ['24px', '32px'],
        34: ['34px', '40px'],
      },
      borderRadius: { DEFAULT: '3px' },
    },
  },
} satisfies Config;
