import next from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';
import prettier from 'eslint-config-prettier';

const config = [
  ...next,
  ...nextTypescript,
  prettier,
  { ignores: ['.next/**', '.next-test/**', '.data/**', 'next-env.d.ts'] },
  {
    files: ['**/*.ts', '**/*.tsx'],
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/ban-ts-comment': 'error',
      'no-console': 'error',
      // Plain links and plain navigation: a page is readable without a script, and fetches nothing before it is asked.
      '@next/next/no-html-link-for-pages': 'off',
      '@next/next/no-location-assign-relative-destination': 'off',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
    },
  },
  // Commands speak to the terminal; everything else speaks through the log.
  { files: ['lib/cli/**', 'db/cli/**', 'tests/**', 'lib/**/cli.ts'], rules: { 'no-console': 'off' } },
];

export default config;
