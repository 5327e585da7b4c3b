import { existsSync, readdirSync } from 'node:fs'
import path from 'node:path'
import tseslint from 'typescript-eslint'
import { importX } from 'eslint-plugin-import-x'

const extensions = ['.ts', '.tsx', '.js', '.mjs']
const namesIn = (at) => (existsSync(at) ? readdirSync(at).filter((name) => name !== 'features') : [])
const zone = (target, from, message, except = []) => ({
  target: `./${target}`,
  from: `./${from}`,
  except: except.map((e) => `./${e}`),
  message,
})
const packages = (files, message, regex, ignores = []) => ({
  files: [files],
  ignores,
  rules: { 'no-restricted-imports': ['error', { patterns: [{ regex, message }] }] },
})

/** The import rules for a tree of this shape at `root`. The canary test calls it with a tree of planted faults. */
export function importRules(root) {
  const zones = [
    zone('shared', 'server', 'shared-is-pure'),
    zone('shared', 'src', 'shared-is-pure'),
    zone('shared/domain', 'shared/contracts', 'domain-below-contracts'),
    zone('src', 'server', 'two-sides'),
    zone('server', 'src', 'two-sides'),
    zone('server/platform', 'server/features', 'platform-below-features'),
    ...['src', 'server', 'shared'].map((side) => zone(side, 'tests', 'nothing-imports-tests')),
    ...['ui', 'lib', 'features'].map((low) => zone(`src/${low}`, 'src/app', 'below-app')),
    ...['ui', 'lib'].map((low) => zone(`src/${low}`, 'src/features', 'below-features')),
  ]
  for (const side of ['src', 'server']) {
    const features = namesIn(path.join(root, side, 'features'))
    const doors = features.map((name) => `${name}/index.ts`)
    for (const name of features)
      zones.push(zone(`${side}/features/${name}`, `${side}/features`, 'by-the-front-door', [name, ...doors]))
    for (const name of namesIn(path.join(root, side)))
      zones.push(zone(`${side}/${name}`, `${side}/features`, 'by-the-front-door', doors))
  }
  return [
    {
      files: ['**/*.{ts,tsx,js,mjs}'],
      plugins: { 'import-x': importX },
      settings: {
        'import-x/extensions': extensions,
        'import-x/resolver-next': [importX.createNodeResolver({ extensions })],
      },
      rules: {
        'import-x/no-cycle': 'error',
        '@typescript-eslint/consistent-type-imports': 'error',
        'import-x/no-restricted-paths': ['error', { basePath: root, zones }],
      },
    },
    packages('src/**', 'not-in-the-browser', '^(node:|(mathjs|express|typeorm|pg)(/|$))'),
    packages('shared/contracts/**', 'contracts-know-zod', '^(?!\\.|zod$)'),
    packages('shared/domain/**', 'domain-knows-itself', '^(?!\\.)'),
    packages('server/features/**', 'sql-has-its-files', '^(express|typeorm|pg)(/|$)', [
      '**/*.{routes,entity,repository,reads}.ts',
    ]),
    packages('server/features/**/*.routes.ts', 'no-sql-in-routes', '^(typeorm|pg)(/|$)'),
    packages('server/features/**/*.{entity,repository,reads}.ts', 'no-http-in-sql', '^express(/|$)'),
  ]
}

/** Words on screen come from a catalogue in shared/messages, so that a second language is data and not a rewrite. */
const literalText = [
  {
    selector: 'JSXText[value=/[A-Za-z]{2}/]',
    message: 'no-literal-text: take the words from shared/messages',
  },
  {
    selector:
      'JSXAttribute[name.name=/^(label|title|placeholder|aria-label|alt|hint|heading)$/] > Literal[value=/[A-Za-z]{2}/]',
    message: 'no-literal-text: take the words from shared/messages',
  },
]

export default tseslint.config(
  { ignores: ['dist/**', '.data/**', 'tests/architecture/canary/**'] },
  ...tseslint.configs.recommended,
  ...importRules(import.meta.dirname),
  {
    files: ['shared/domain/**/*.ts'],
    rules: {
      'no-restricted-globals': ['error', 'process', 'console', 'crypto', 'performance', 'setTimeout'],
      'no-restricted-properties': [
        'error',
        { object: 'Date', property: 'now', message: 'take the instant as a parameter' },
        { object: 'Math', property: 'random', message: 'take ids and seeds as parameters' },
      ],
      'no-restricted-syntax': [
        'error',
        {
          selector: "NewExpression[callee.name='Date'][arguments.length=0]",
          message: 'take the instant as a parameter',
        },
      ],
    },
  },
  { files: ['src/**/*.tsx'], rules: { 'no-restricted-syntax': ['error', ...literalText] } },
  { rules: { '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }] } },
)
