import path from 'node:path';
import js from '@eslint/js';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';
import { reasonAgainst } from './tests/guards/import-zones.mjs';

const here = import.meta.dirname;

/** Refuses an import that crosses a zone, with the zone's reason as the message. */
const importZones = {
  meta: { type: 'problem', schema: [], messages: { refused: '"{{specifier}}" may not be imported here. {{reason}}' } },
  create(context) {
    const importer = path.relative(here, context.filename).split(path.sep).join('/');
    const look = (source) => {
      if (source?.type !== 'Literal' || typeof source.value !== 'string') return;
      const reason = reasonAgainst(importer, source.value);
      if (reason) context.report({ node: source, messageId: 'refused', data: { specifier: source.value, reason } });
    };
    return {
      ImportDeclaration: ({ source }) => look(source),
      ExportNamedDeclaration: ({ source }) => look(source),
      ExportAllDeclaration: ({ source }) => look(source),
      ImportExpression: ({ source }) => look(source),
      TSImportType: ({ source }) => look(source),
    };
  },
};

/** The environment is read once, checked, and handed on. */
const noEnvironment = [
  { selector: 'MemberExpression[object.name="process"][property.name="env"]', message: 'Only server/env.ts reads the environment: take what you need as an argument.' },
  { selector: 'ImportDeclaration[source.value="zod"] > ImportSpecifier', message: "Write import * as z from 'zod': a named import brings the whole package into the browser." },
];

export default tseslint.config(
  { ignores: ['dist/', 'node_modules/', '.data/', 'coverage/', 'drizzle/', 'tests/bench/node_modules/'] },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  {
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    plugins: { own: { rules: { 'import-zones': importZones } } },
    rules: {
      'own/import-zones': 'error',
      'max-lines': ['error', { max: 350 }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'off',
      'no-restricted-syntax': ['error', ...noEnvironment],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrorsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports', disallowTypeAnnotations: false }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/ban-ts-comment': 'error',
      '@typescript-eslint/no-empty-function': 'off',
    },
  },
  {
    files: ['client/**/*.{ts,tsx}'],
    plugins: { 'react-hooks': reactHooks },
    rules: { ...reactHooks.configs.recommended.rules },
  },
  {
    files: ['**/*.mjs', '*.js'],
    languageOptions: { globals: Object.fromEntries(['process', 'console', 'URL', 'setTimeout', 'clearTimeout', 'setInterval', 'clearInterval', 'fetch', 'AbortSignal'].map((name) => [name, 'readonly'])) },
  },
  {
    // These read the environment: the one reader, what runs before it, and what prepares the tests.
    files: ['server/env.ts', 'server/bootstrap/**', 'tests/setup/**', 'tests/bench/**', '*.config.{js,ts}'],
    rules: { 'no-restricted-syntax': ['error', ...noEnvironment.slice(1)] },
  },
);
