import next from 'eslint-config-next';
import nextTypescript from 'eslint-config-next/typescript';
import tseslint from 'typescript-eslint';

const counted = { skipBlankLines: false, skipComments: false };

export default tseslint.config(
  { ignores: ['.next/', '.fourfold/', 'node_modules/', 'next-env.d.ts', 'db/schema.generated.ts', 'lib/readers/table/table-rows/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...next,
  ...nextTypescript,
  {
    files: ['**/*.ts', '**/*.tsx'],
    extends: [tseslint.configs.recommendedTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  {
    rules: {
      'max-lines': ['error', { max: 300, ...counted }],
      'no-console': 'error',
      eqeqeq: 'error',
    },
  },
  { files: ['docker/**', 'fixtures/**', 'worker/commands/**', 'db/migrate.ts', 'tests/bench/**', 'tests/fuzz/**'], rules: { 'no-console': 'off' } },
  { files: ['tests/**'], rules: { 'max-lines': ['error', { max: 500, ...counted }] } },
);
