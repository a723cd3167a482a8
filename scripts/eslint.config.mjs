import { fileURLToPath } from 'node:url';
import reactHooks from 'eslint-plugin-react-hooks';
import { defineConfig } from 'eslint/config';
import tseslint from 'typescript-eslint';

const root = fileURLToPath(new URL('..', import.meta.url));

const NO_WORLD = 'src/core is pure: it is handed instants, random numbers and texts, and hands values back.';
const forbiddenGlobals = [
  ...['Date', 'Intl', 'Temporal', 'console', 'process', 'globalThis', 'fetch', 'crypto', 'performance'],
  ...['setTimeout', 'setInterval', 'setImmediate', 'queueMicrotask', 'window', 'document', 'navigator'],
].map((name) => ({ name, message: NO_WORLD }));

const onlyOrSkip = (object) => ({
  selector: `MemberExpression[object.name='${object}'][property.name=/^(only|skip|todo|fails)$/]`,
  message: 'Every test runs, always. Remove the test or mend it.',
});

export default defineConfig(
  { ignores: ['**/dist/**', '.astro/**', '.steadmain/**', 'node_modules/**', '**/*.astro'] },
  {
    files: ['**/*.{ts,tsx}'],
    extends: [...tseslint.configs.recommended],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: root } },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    rules: {
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true, requireDefaultForNonUnion: true },
      ],
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/no-unnecessary-type-assertion': 'error',
      '@typescript-eslint/consistent-type-imports': [
        'error',
        { fixStyle: 'inline-type-imports', disallowTypeAnnotations: false },
      ],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-var': 'error',
      'prefer-const': 'error',
      'max-lines': ['error', { max: 250, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ['src/core/**/*.ts'],
    rules: {
      'no-restricted-globals': ['error', ...forbiddenGlobals],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: NO_WORLD },
        { property: 'toLocaleString', message: NO_WORLD },
        { property: 'localeCompare', message: `${NO_WORLD} Its order differs between machines; compare with <.` },
      ],
    },
  },
  {
    // Numeric kernels: splitting a formula or an inner loop hides it.
    files: ['src/core/{steam,duty,levelling}/**/*.ts', 'src/solver/**/*.ts'],
    rules: { 'max-lines': ['error', { max: 700, skipBlankLines: true, skipComments: true }] },
  },
  {
    files: ['src/server/**/*.ts', 'src/pages/**/*.ts', 'src/middleware.ts'],
    ignores: ['src/server/clock.ts'],
    rules: {
      'no-restricted-syntax': [
        'error',
        {
          selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
          message: 'The server reads the time in one place, src/server/clock.ts, so that tests can set it.',
        },
        {
          selector: "NewExpression[callee.name='Date'][arguments.length=0]",
          message: 'The server reads the time in one place, src/server/clock.ts, so that tests can set it.',
        },
      ],
    },
  },
  { ...reactHooks.configs.flat['recommended-latest'], files: ['src/components/**/*.{ts,tsx}'] },
  {
    files: ['tests/**/*.{ts,tsx}'],
    rules: {
      'no-restricted-syntax': ['error', onlyOrSkip('it'), onlyOrSkip('test'), onlyOrSkip('describe')],
      // A table of cases reads best whole.
      'max-lines': 'off',
    },
  },
);
