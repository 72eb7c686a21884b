import type { Config } from 'tailwindcss'

const token = (name: string): string => `oklch(var(--${name}) / <alpha-value>)`
const names = [
  'surface', 'surface-raised', 'surface-sunken', 'ink', 'ink-muted', 'rule', 'rule-strong', 'accent', 'accent-soft', 'action', 'on-action',
  'ok', 'warn', 'warn-soft', 'bad', 'bad-soft', 'series-1', 'series-2', 'series-3', 'series-4', 'series-5', 'series-6',
]

/** Only the meanings of tokens.css exist as colours: a raw colour in a component does not compile. */
export default {
  content: ['./app/**/*.{vue,ts}'],
  darkMode: ['selector', '[data-theme="night"]'],
  theme: {
    colors: { transparent: 'transparent', current: 'currentColor', ...Object.fromEntries(names.map(name => [name, token(name)])) },
    fontFamily: {
      sans: ['"Atkinson Next"', 'system-ui', 'sans-serif'],
      mono: ['"Atkinson Mono"', 'ui-monospace', 'monospace'],
    },
    fontSize: {
      'xs': ['0.75rem', '1.125rem'],
      'sm': ['0.8125rem', '1.25rem'],
      'base': ['0.9375rem', '1.45rem'],
      'lg': ['1.1875rem', '1.6rem'],
      'xl': ['1.375rem', '1.75rem'],
      '2xl': ['1.75rem', '2.1rem'],
      'loud': ['3.5rem', '1.05'],
    },
    extend: {
      borderRadius: { DEFAULT: '7px' },
      transitionDuration: { DEFAULT: '120ms' },
      maxWidth: { page: '96rem', prose: '44rem' },
    },
  },
} satisfies Config
