import type { Config } from 'tailwindcss';

const tones = ['info', 'ok', 'warn', 'danger', 'ready', 'out', 'held', 'clear', 'upcoming', 'due', 'overdue'];
const grounds = ['paper', 'raised', 'shoal', 'buff', 'ink', 'ink-soft', 'hairline', 'edge', 'line'];
const actions = ['act', 'act-over', 'act-ink', 'danger-act', 'danger-ink', 'sign'];
const names = [...grounds, ...actions, ...tones, ...tones.map((tone) => `${tone}-tint`)];

/**
 * Names the tokens of `app/globals.css` for class names. The stock palette is replaced, not extended,
 * so a colour that is not a token does not compile into anything.
 */
const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ...Object.fromEntries(names.map((name) => [name, `var(--${name})`])),
    },
    fontFamily: { sans: 'var(--font-text)', mono: 'var(--font-meter)' },
    extend: {
      spacing: { target: 'var(--target)', dock: 'var(--target-dock)', gutter: 'var(--gutter)' },
      borderRadius: { DEFAULT: '3px', hull: '3px 3px 14px 3px' },
      maxWidth: { page: '84rem', prose: '42rem' },
    },
  },
};

export default config;
