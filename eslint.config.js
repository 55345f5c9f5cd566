import js from '@eslint/js';
import svelte from 'eslint-plugin-svelte';
import globals from 'globals';
import ts from 'typescript-eslint';
import svelteConfig from './svelte.config.js';

// Flat config replaces a rule's options, it does not merge them: each rule is set once.
export default ts.config(
  { ignores: ['build', '.svelte-kit', 'node_modules', 'test/output', 'test-results'] },
  js.configs.recommended,
  ...ts.configs.recommended,
  ...svelte.configs.recommended,
  {
    languageOptions: { globals: { ...globals.browser, ...globals.node, __APP_VERSION__: 'readonly' } },
    rules: {
      'no-undef': 'off',
      'no-console': 'error',
      eqeqeq: ['error', 'always'],
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'svelte/no-navigation-without-resolve': 'off',
      'svelte/no-at-html-tags': 'error'
    }
  },
  {
    files: ['**/*.svelte', '**/*.svelte.ts'],
    languageOptions: { parserOptions: { parser: ts.parser, extraFileExtensions: ['.svelte'], svelteConfig } }
  },
  { files: ['src/cli/**', 'test/**'], rules: { 'no-console': 'off' } },
  {
    // Kernels index typed arrays; noUncheckedIndexedAccess stays, so they may assert an element is there.
    files: ['src/lib/core/{numerics,design,analysis}/**', 'test/**'],
    rules: { '@typescript-eslint/no-non-null-assertion': 'off' }
  }
);
