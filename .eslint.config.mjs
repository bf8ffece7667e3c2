import js from '@eslint/js';
import hooks from 'eslint-plugin-react-hooks';
import globals from 'globals';
import tseslint from 'typescript-eslint';

const tests = ['**/*.test.{ts,tsx}', '**/*.long.ts', 'tests/**'];

/** Only these read the environment; everything else is given what it needs. */
const environmentReaders = [
  'server/config/**',
  'server/main.ts',
  'server/db/migrate.ts',
  'server/db/seed/main.ts',
];

const noEnvironment = {
  selector: "MemberExpression[object.name='process'][property.name='env']",
  message: 'Only server/config and server/setup read the environment; take the setting as an argument.',
};

export default tseslint.config(
  { ignores: ['dist/', '.data/', '.bench/', '.cache/', 'drizzle/', 'node_modules/', 'src/node_modules/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  js.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.recommendedTypeChecked],
    languageOptions: { parserOptions: { projectService: true } },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/ban-ts-comment': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      // What someone else threw is passed on as it is.
      '@typescript-eslint/prefer-promise-reject-errors': 'off',
      // A function may have to return a promise, whatever it waits for.
      '@typescript-eslint/require-await': 'off',
      // tsc reports these already.
      '@typescript-eslint/no-unused-vars': 'off',
    },
  },
  {
    rules: {
      'no-eval': 'error',
      'no-new-func': 'error',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
      'no-restricted-syntax': ['error', noEnvironment],
    },
  },
  { files: ['**/*.{ts,tsx}'], rules: { '@typescript-eslint/no-implied-eval': 'error' } },
  {
    files: ['src/**/*.{ts,tsx}'],
    plugins: { 'react-hooks': hooks },
    rules: { 'react-hooks/rules-of-hooks': 'error', 'react-hooks/exhaustive-deps': 'error' },
  },
  { files: ['**/*.mjs'], languageOptions: { globals: globals.node } },
  {
    files: ['server/setup/**', 'vite.config.ts', ...environmentReaders],
    rules: { 'no-restricted-syntax': 'off' },
  },
  {
    files: tests,
    rules: {
      'max-lines': 'off',
      'no-restricted-syntax': 'off',
      // Replies and parsed documents are looked at piece by piece.
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
    },
  },
  { files: ['server/db/seed/items/**', 'shared/engine/physics/**'], rules: { 'max-lines': 'off' } },
);
