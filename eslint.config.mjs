import js from '@eslint/js';
import tseslint from 'typescript-eslint';

const namedExportsOnly = {
  selector: 'ExportDefaultDeclaration',
  message: 'Named exports only: a default export loses its name at the import.',
};

export default tseslint.config(
  { ignores: ['dist', 'coverage', 'reports', 'data-demo', 'out', 'test/fixtures', 'test/golden', '**/*.cjs'] },
  js.configs.recommended,
  tseslint.configs.recommendedTypeChecked,
  {
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    rules: {
      'no-console': 'error',
      'no-restricted-syntax': ['error', namedExportsOnly],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { args: 'after-used', argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrors: 'all' },
      ],
    },
  },
  {
    // Hot typed-array loops index in bounds by construction; tests state what they know.
    files: ['test/**', 'src/engineering/**', 'src/store/**', 'src/inventory/**', 'src/screening/**'],
    rules: { '@typescript-eslint/no-non-null-assertion': 'off' },
  },
  {
    files: ['src/cli/output.ts', 'src/cli/output/**', 'scripts/**', 'test/bench/**'],
    rules: { 'no-console': 'off' },
  },
  {
    // Tools that demand a default export.
    files: ['*.config.{ts,mjs}', 'scripts/closing-line-reporter.mjs'],
    rules: { 'no-restricted-syntax': 'off' },
  },
  {
    // A value stored by one engine must equal the one another computes: numeric/elementary.ts has exp, ln and sin, numeric/power.ts powers.
    files: ['src/engineering/**'],
    ignores: ['src/engineering/format.ts'],
    rules: {
      'no-restricted-properties': [
        'error',
        ...[
          'exp',
          'log',
          'log2',
          'log10',
          'log1p',
          'expm1',
          'pow',
          'sin',
          'cos',
          'tan',
          'asin',
          'acos',
          'atan',
          'atan2',
          'sinh',
          'cosh',
          'tanh',
          'cbrt',
          'hypot',
        ].map((property) => ({
          object: 'Math',
          property,
          message: 'differs between engines: see numeric/elementary.ts',
        })),
      ],
      'no-restricted-syntax': [
        'error',
        namedExportsOnly,
        { selector: "BinaryExpression[operator='**']", message: 'differs between engines: see numeric/power.ts' },
      ],
    },
  },
  {
    // Plain JavaScript carries no types for the unsafe-use rules to judge; promises are still watched.
    files: ['**/*.mjs'],
    rules: {
      'no-undef': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
);
