import typescript from 'typescript-eslint';
import arrowsRule from './test/lint/arrows.cjs';

export default typescript.config(
  { ignores: ['dist/**', 'node_modules/**', 'libs/club/database/generated/**', '.duskwright/**'] },
  {
    files: ['**/*.ts'],
    extends: [typescript.configs.strict, typescript.configs.stylistic],
    plugins: { duskwright: { rules: { arrows: arrowsRule.arrows } } },
    rules: {
      'duskwright/arrows': 'error',
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      '@typescript-eslint/array-type': ['error', { default: 'array' }],
      '@typescript-eslint/consistent-type-definitions': ['error', 'interface'],
      // Typed arrays and tables are read at computed places that the loop bounds; tests cover them.
      '@typescript-eslint/no-non-null-assertion': 'off',
      eqeqeq: 'error',
      'no-console': 'error',
      'prefer-const': 'error',
      curly: ['error', 'multi-line'],
    },
  },
  {
    // Nest injects by class, so its imports must stay values.
    files: ['libs/**/*.ts', 'apps/cli/**/*.ts', 'test/**/*.ts', 'demo-data/**/*.ts'],
    rules: { '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }] },
  },
);
