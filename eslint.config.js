const expo = require('eslint-config-expo/flat');
const prettier = require('eslint-config-prettier');

const rawColour = 'Literal[value=/^(#[0-9a-fA-F]{3,8}|rgba?\\(.*|hsla?\\(.*)$/]';

module.exports = [
  { ignores: ['node_modules/**', '.data/**', '.expo/**', 'dist/**', 'expo-env.d.ts'] },
  ...expo,
  {
    files: ['**/*.{ts,tsx}'],
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/ban-ts-comment': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-require-imports': 'off',
      'no-empty': ['error', { allowEmptyCatch: false }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      'import/no-default-export': 'off',
      // fast-check's default export is its documented way in.
      'import/no-named-as-default-member': 'off',
      'max-lines': ['error', { max: 400, skipBlankLines: false, skipComments: false }],
    },
  },
  {
    files: ['components/**/*.{ts,tsx}', 'app/**/*.{ts,tsx}'],
    ignores: ['components/theme/**'],
    rules: {
      'no-restricted-syntax': [
        'error',
        { selector: rawColour, message: 'Colours come from the theme.' },
        {
          selector:
            'Property[key.name=/^(padding|margin|fontSize|lineHeight|borderRadius|gap)/] > Literal[value>2]',
          message: 'Sizes come from the theme.',
        },
      ],
    },
  },
  {
    files: ['shared/**/*.ts'],
    rules: {
      'no-restricted-globals': [
        'error',
        ...[
          'window',
          'document',
          'process',
          'fetch',
          'localStorage',
          'setTimeout',
          'setInterval',
          'performance',
        ].map((name) => ({ name, message: 'shared/ runs anywhere: no DOM, Node, network or clock.' })),
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Date', property: 'now', message: 'Time is an argument.' },
        { object: 'Math', property: 'random', message: 'A seed is an argument.' },
      ],
    },
  },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/config/**', 'server/local/**', 'server/dev.ts'],
    rules: {
      'no-restricted-properties': [
        'error',
        { object: 'process', property: 'env', message: 'The environment is parsed in server/config only.' },
      ],
    },
  },
  {
    files: [
      'server/cli/**/*.ts',
      'server/main.ts',
      'server/dev.ts',
      'server/local/**',
      'tests/run.ts',
      'tests/bench/**',
    ],
    rules: { 'no-console': 'off' },
  },
  prettier,
];
