import js from '@eslint/js';
import angular from 'angular-eslint';
import tseslint from 'typescript-eslint';

const noNamedZod = {
  selector: "ImportDeclaration[source.value='zod'] > ImportSpecifier",
  message: "Write `import * as z from 'zod'`: the named export keeps every locale in the bundle.",
};

export default tseslint.config(
  { ignores: ['dist/', '.local/', '.angular/', 'node_modules/', 'test/reference/data/'] },
  js.configs.recommended,
  {
    files: ['**/*.mjs', '**/*.cjs', '**/*.js'],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        URL: 'readonly',
        require: 'readonly',
        jest: 'readonly',
        module: 'writable',
        __dirname: 'readonly',
        __filename: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        setInterval: 'readonly',
        clearInterval: 'readonly',
        fetch: 'readonly',
        Buffer: 'readonly',
        AbortSignal: 'readonly',
        document: 'readonly',
        localStorage: 'readonly',
        window: 'readonly',
      },
    },
  },
  {
    files: ['**/*.ts'],
    extends: [tseslint.configs.recommended],
    rules: {
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_' },
      ],
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      'no-restricted-syntax': ['error', noNamedZod],
      eqeqeq: ['error', 'smart'],
    },
  },
  {
    files: ['client/**/*.ts'],
    extends: [angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/component-selector': [
        'error',
        { type: ['element', 'attribute'], prefix: 'vw', style: 'kebab-case' },
      ],
      '@angular-eslint/component-class-suffix': 'off',
      '@angular-eslint/directive-class-suffix': 'off',
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      'no-console': 'error',
      '@typescript-eslint/no-restricted-imports': [
        'error',
        {
          patterns: [
            {
              group: ['@shared/**/*-contract'],
              allowTypeImports: true,
              message: 'Contracts are types only in the client.',
            },
          ],
        },
      ],
    },
  },
  {
    files: ['server/**/*.ts', 'jobs/**/*.ts', 'shared/**/*.ts', 'db/**/*.ts'],
    rules: { 'no-console': 'error' },
  },
  {
    files: ['client/**/*.html'],
    extends: [angular.configs.templateRecommended, angular.configs.templateAccessibility],
  },
);
