import vitals from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';
import tseslint from 'typescript-eslint';
import project from './lib/ops/lint/plugin.mjs';

const ENVIRONMENT = 'Read it in lib/platform/env.ts, where it is checked at start, and take it from env().';
const COLOUR =
  'Colours are named: use a token of tailwind.config.ts, so that both themes and the contrast tests know it.';
const COERCE = 'z.coerce turns "" and null into 0: numbers come from parseQuantity in lib/measurement/units.';
const LITERAL = 'Raw SQL goes into a query with bind, where a value can’t become code.';
const ACTION = 'There are no server actions: a write is a handler under /api/v1, made with defineRoute.';
const RAW_HTML = 'Text is rendered as text or through react-markdown with rehype-sanitize, never as raw HTML.';

const HEX = String.raw`/(^|[\s:(\[,'"])#([0-9a-f]{3,4}|[0-9a-f]{6}|[0-9a-f]{8})\b|\b(rgb|rgba|hsl|oklch)\(/i`;
const everywhere = [
  { selector: "MemberExpression[object.name='z'][property.name='coerce']", message: COERCE },
  { selector: "CallExpression[callee.property.name='literal'][callee.object.name!='z']", message: LITERAL },
  { selector: "CallExpression[callee.name='literal']", message: LITERAL },
  { selector: "ExpressionStatement[directive='use server']", message: ACTION },
];
const colours = [
  { selector: `JSXAttribute[name.name!='href'] Literal[value=${HEX}]`, message: COLOUR },
  { selector: `CallExpression[callee.name=/^(cn|clsx|cva)$/] Literal[value=${HEX}]`, message: COLOUR },
  { selector: `TemplateElement[value.raw=${HEX}]`, message: COLOUR },
];
const rawHtml = { selector: "JSXAttribute[name.name='dangerouslySetInnerHTML']", message: RAW_HTML };

export default tseslint.config(
  {
    ignores: [
      '**/.next/**',
      '**/.next-*/**',
      '.data/**',
      'uploads/**',
      'coverage/**',
      'next-env.d.ts',
      '.stryker-tmp/**',
    ],
  },
  ...vitals,
  ...nextTypescript,
  ...tseslint.configs.strict.map((config) => ({ files: ['**/*.{ts,tsx}'], ...config })),
  {
    plugins: { project },
    rules: {
      'project/one-way-imports': 'error',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      'no-restricted-syntax': ['error', ...everywhere],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', ignoreRestSiblings: true }],
    },
  },
  {
    files: ['**/*.{ts,tsx}'],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      // A promise nobody waits for is a write that may be lost and an error that nobody sees.
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-explicit-any': 'error',
    },
  },
  {
    // Reading a stranger's file is no computation: traces/import has the limit of files alone.
    files: ['lib/measurement/**/*.ts'],
    ignores: ['lib/measurement/traces/import/**'],
    rules: { 'max-lines-per-function': ['error', { max: 40, skipComments: true, skipBlankLines: true }] },
  },
  {
    files: ['app/**', 'components/**', 'lib/**', 'models/**', 'seeders/**'],
    ignores: ['lib/platform/env.ts', 'lib/ops/**'],
    rules: {
      'no-restricted-properties': ['error', { object: 'process', property: 'env', message: ENVIRONMENT }],
    },
  },
  {
    files: ['app/**/*.tsx', 'components/**/*.{ts,tsx}'],
    rules: { 'no-restricted-syntax': ['error', ...everywhere, ...colours, rawHtml] },
  },
  // The script that sets the theme before the first paint is a constant of ours, and the policy names its hash.
  { files: ['app/layout.tsx'], rules: { 'no-restricted-syntax': ['error', ...everywhere, ...colours] } },
  {
    files: ['tests/**'],
    rules: {
      'no-console': 'off',
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/consistent-type-imports': [
        'error',
        { fixStyle: 'inline-type-imports', disallowTypeAnnotations: false },
      ],
    },
  },
  { files: ['*.config.mjs'], rules: { 'import/no-anonymous-default-export': 'off' } },
  // Programs of the command line talk on the console.
  { files: ['lib/ops/**'], rules: { 'no-console': 'off' } },
);
