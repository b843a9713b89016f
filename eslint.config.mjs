import web from 'eslint-config-next/core-web-vitals'
import typescript from 'eslint-config-next/typescript'

const NO_DRAWERS = 'Name it after what it does: no utils, helpers, common, misc, process, handle or manage.'

/**
 * A promise nobody waits for is a mail never sent or an assertion never made. Needs the types of everything, which
 * costs as much as all the rest: `npm test` asks for it (LINT=full), `npm run check` does not.
 */
const promises = {
  files: ['lib/**/*.ts', 'app/**/*.ts', 'scripts/**/*.ts', 'seeders/**/*.ts', 'tests/**/*.{ts,tsx}'],
  languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
  rules: {
    '@typescript-eslint/no-floating-promises': 'error',
    '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: false }],
  },
}

const config = [
  {
    ignores: [
      '.next/**',
      '.data/**',
      '.cache/**',
      'node_modules/**',
      'coverage/**',
      'next-env.d.ts',
      'test-results/**',
    ],
  },
  ...web,
  ...typescript,
  {
    rules: {
      'no-console': ['error', { allow: ['warn', 'error'] }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-warning-comments': ['error', { terms: ['fixme', 'xxx', 'hack'] }],
      'no-restricted-imports': [
        'error',
        { patterns: [{ regex: '/(utils|helpers|common|misc)$', message: NO_DRAWERS }] },
      ],
      'import/no-anonymous-default-export': 'off',
      // Pictures are made in their sizes on upload; nothing is resized per request.
      '@next/next/no-img-element': 'off',
      // Its reason, a bundler's global, ended with CommonJS; a module is what this trade sells.
      '@next/next/no-assign-module-variable': 'off',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrorsIgnorePattern: '^_' },
      ],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
    },
  },
  ...(process.env.LINT === 'full' ? [promises] : []),
  {
    // No component lives here; what begins with "use" is no hook.
    files: ['lib/**', 'scripts/**', 'seeders/**', 'tests/**/*.ts'],
    rules: { 'react-hooks/rules-of-hooks': 'off' },
  },
  {
    files: ['scripts/**'],
    rules: { 'no-console': 'off' },
  },
]

export default config
