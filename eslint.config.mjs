import nextVitals from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';

const config = [
  ...nextVitals,
  ...nextTypescript,
  {
    ignores: [
      '.next/**',
      '.data/**',
      'node_modules/**',
      'public/**',
      'coverage/**',
      'next-env.d.ts',
      'test-results/**',
    ],
  },
  {
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'no-console': ['error', { allow: ['warn', 'error'] }],
      'no-warning-comments': ['error', { terms: ['todo', 'fixme', 'xxx'], location: 'anywhere' }],
      eqeqeq: ['error', 'always'],
    },
  },
  { files: ['scripts/**', 'tests/**'], rules: { 'no-console': 'off' } },
  // No React here: a helper named use… sets something up for its test file.
  {
    files: ['tests/{server,migrations,simulation,scripts,support}/**'],
    rules: { 'react-hooks/rules-of-hooks': 'off' },
  },
];

export default config;
