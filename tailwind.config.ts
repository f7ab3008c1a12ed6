import type { Config } from 'tailwindcss';

/** Every colour is a custom property of apps/board/src/styles/tokens.css; no other colour exists as a class. */
const tokens = [
  ...['linen', 'paper', 'bleached', 'sunk', 'ink', 'ink-2', 'ink-3', 'thread', 'thread-2', 'hair'],
  ...['indigo', 'indigo-deep', 'indigo-wash', 'on-indigo', 'woad', 'woad-wash'],
  ...['madder', 'madder-wash', 'madder-deep', 'on-madder', 'weld', 'weld-wash', 'walnut', 'walnut-wash'],
  ...['focus', 'scrim'],
];

export default {
  content: ['./index.html', './apps/board/src/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ...Object.fromEntries(tokens.map((name) => [name, `var(--${name})`])),
    },
    fontFamily: { sans: ['"Source Sans 3 Variable"', 'system-ui', 'sans-serif'] },
    fontSize: {
      display: ['2.75rem', { lineHeight: '3.125rem', fontWeight: '300' }],
      title: ['1.875rem', { lineHeight: '2.25rem', fontWeight: '300' }],
      page: ['1.625rem', { lineHeight: '2rem', fontWeight: '300' }],
      question: ['1.875rem', { lineHeight: '2.375rem', fontWeight: '300' }],
      result: ['1.625rem', { lineHeight: '2.125rem', fontWeight: '300' }],
      numeral: ['1.375rem', { lineHeight: '1.625rem', fontWeight: '300' }],
      sheet: ['1.25rem', { lineHeight: '1.625rem', fontWeight: '600' }],
      head: ['1.125rem', { lineHeight: '1.5rem', fontWeight: '600' }],
      family: ['1.0625rem', { lineHeight: '1.5625rem', fontWeight: '400' }],
      sentence: ['0.9375rem', { lineHeight: '1.375rem', fontWeight: '400' }],
      body: ['0.875rem', { lineHeight: '1.25rem', fontWeight: '400' }],
      label: ['0.8125rem', { lineHeight: '1.125rem', fontWeight: '600' }],
      small: ['0.8125rem', { lineHeight: '1.125rem', fontWeight: '400' }],
      fine: ['0.75rem', { lineHeight: '1rem', fontWeight: '400' }],
      initials: ['0.6875rem', { lineHeight: '1rem', fontWeight: '600' }],
    },
    fontWeight: { light: '300', normal: '400', semibold: '600', emphasis: '650' },
    borderRadius: { none: '0', tag: '2px', DEFAULT: '3px', now: '4px', full: '9999px' },
    boxShadow: { none: 'none', lift: 'var(--lift)' },
    transitionTimingFunction: { DEFAULT: 'cubic-bezier(.2,.7,.2,1)' },
    transitionDuration: { DEFAULT: '120ms', sheet: '200ms', replan: '420ms' },
  },
} satisfies Config;
