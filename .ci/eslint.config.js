import js from '@eslint/js';
import svelte from 'eslint-plugin-svelte';
import globals from 'globals';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import tseslint from 'typescript-eslint';
import svelteConfig from '../svelte.config.js';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const typed = ['src/**/*.ts', 'src/**/*.svelte', 'test/**/*.ts', 'vite.config.ts'];
const argued = 'core takes the time, chance and the world as arguments';

/** What core may not even name: the clock, chance, the network, the page, Node. The compiler knows most of them not. */
const impureGlobals = [
  'Date',
  'performance',
  'setTimeout',
  'setInterval',
  'queueMicrotask',
  'crypto',
  'globalThis',
  'window',
  'self',
  'document',
  'navigator',
  'location',
  'localStorage',
  'indexedDB',
  'fetch',
  'console',
  'process',
  'Buffer',
  'structuredClone',
];

const impureSyntax = [
  {
    selector: 'CallExpression[callee.property.name=/^(toLocale\\w+|localeCompare)$/]',
    message: 'Two tablets with two languages must reckon the same: compare code units, and leave wording to words.',
  },
  {
    selector:
      'Program > VariableDeclaration[kind="let"], Program > ExportNamedDeclaration > VariableDeclaration[kind="let"]',
    message: 'A variable of the module is state that outlives a call, and core keeps none.',
  },
  { selector: 'AwaitExpression', message: 'Core never waits.' },
];

export default tseslint.config(
  { ignores: ['build/', '.svelte-kit*/', '.cache/', 'node_modules/', 'test-results/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  js.configs.recommended,
  {
    files: typed,
    extends: [tseslint.configs.recommendedTypeChecked],
    languageOptions: {
      globals: { ...globals.browser, ...globals.node },
      parserOptions: { projectService: true, tsconfigRootDir: root, extraFileExtensions: ['.svelte'] },
    },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { disallowTypeAnnotations: false }],
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true, allowBoolean: true }],
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      '@typescript-eslint/unbound-method': 'off',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-eval': 'error',
      'no-implied-eval': 'error',
      'no-new-func': 'error',
    },
  },
  ...svelte.configs.recommended,
  {
    files: ['**/*.svelte', '**/*.svelte.ts'],
    languageOptions: { parserOptions: { parser: tseslint.parser, svelteConfig } },
  },
  {
    files: ['**/*.svelte'],
    rules: {
      'prefer-const': 'off',
      'svelte/prefer-const': 'error',
      'svelte/no-at-html-tags': 'error',
      'svelte/require-each-key': 'error',
      // Links are hash addresses, which need no resolving against a base.
      'svelte/no-navigation-without-resolve': 'off',
      // The linter cannot see the types of a component's props; svelte-check does, and is strict about them.
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
  {
    // State in this room is replaced whole and never changed in place, so sets and maps need no reactive twin.
    files: ['src/bench/**/*.ts'],
    rules: { 'svelte/prefer-svelte-reactivity': 'off', 'svelte/no-navigation-without-resolve': 'off' },
  },
  {
    // SvelteKit keeps this folder out of its own project: a worker has other globals than a page.
    files: ['src/service-worker/**/*.ts'],
    languageOptions: {
      globals: globals.serviceworker,
      parserOptions: { projectService: false, project: ['.ci/tsconfig.worker.json'], tsconfigRootDir: root },
    },
  },
  {
    files: ['src/**'],
    rules: {
      'no-console': 'error',
      'no-restricted-properties': ['error', { object: 'Math', property: 'random', message: 'Chance comes by a port.' }],
    },
  },
  {
    files: ['src/command-line/**'],
    rules: { 'no-console': 'off' },
  },
  {
    files: ['src/core/**/*.ts'],
    rules: {
      'no-restricted-globals': ['error', ...impureGlobals.map((name) => ({ name, message: argued }))],
      'no-restricted-syntax': ['error', ...impureSyntax],
    },
  },
  {
    files: ['test/**/*.ts'],
    rules: {
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
  {
    files: ['.ci/**/*.{js,mjs}', 'test/**/*.{js,mjs}', 'svelte.config.js'],
    languageOptions: { globals: { ...globals.node, ...globals.browser } },
  },
);
