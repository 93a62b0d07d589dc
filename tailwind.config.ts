import type { Config } from 'tailwindcss';

/** The look's tokens. Their light and dark values stand in app/globals.css as custom properties. */
const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}', './lib/twig/**/*.ts'],
  theme: {
    extend: {
      colors: {
        ground: 'var(--ground)',
        ink: 'var(--ink)',
        soft: 'var(--soft)',
        rule: 'var(--rule)',
        wash: 'var(--wash)',
        leaf: 'var(--leaf)',
        bark: 'var(--bark)',
        tape: 'var(--tape)',
        action: 'var(--action)',
        'on-action': 'var(--on-action)',
        blue: 'var(--blue)',
      },
      fontFamily: { sans: ['var(--font-text)', 'system-ui', 'sans-serif'] },
      fontSize: {
        question: ['1.75rem', { lineHeight: '1.85' }],
        answer: ['4.5rem', { lineHeight: '1' }],
        note: ['0.86em', { lineHeight: '1.5' }],
      },
      maxWidth: { measure: '42rem', page: '64rem' },
      minHeight: { finger: '48px' },
      minWidth: { finger: '48px' },
    },
  },
};

export default config;
