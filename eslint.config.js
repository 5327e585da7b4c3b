import { existsSync, readdirSync } from 'node:fs'
import path from 'node:path'
import tseslint from 'typescript-eslint'
import { importX } from 'eslint-plugin-import-x'

const extensions = ['.ts', '.tsx', '.js', '.mjs']
const namesIn = (at) => (existsSync(at) ? readdirSync(at).filter((name) => name !== 'features') : [])
// each message is its own, so that the canary test can ask for a planted fault per zone and not only per rule
const zone = (target, from, name, except = []) => ({
  target: `./${target}`,
  from: `./${from}`,
  except: except.map((e) => `./${e}`),
  message: `${name}: ${target} does not import ${from}${except.length > 0 ? ' but by its index.ts' : ''}`,
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
        'import-x/no-cycle': ['error', { ignoreExternal: true }],
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

const forbidden = (message, selectors) => selectors.map((selector) => ({ selector, message }))

/** shared/domain computes from its arguments only: no clock, no chance, no place it runs in. */
export const domainRules = {
  files: ['shared/domain/**/*.ts'],
  rules: {
    'no-restricted-globals': [
      'error',
      ...['process', 'console', 'crypto', 'performance', 'globalThis', 'Buffer', 'fetch', 'Temporal'],
      ...['setTimeout', 'setInterval', 'setImmediate', 'queueMicrotask'],
    ].map((name) =>
      name === 'error' ? name : { name, message: `domain-is-pure: ${name} is not for the domain` },
    ),
    'no-restricted-properties': [
      'error',
      {
        object: 'Date',
        property: 'now',
        message: 'domain-is-pure: take the instant as a parameter, no Date.now',
      },
      { object: 'Math', property: 'random', message: 'domain-is-pure: take ids and seeds as parameters' },
    ],
    'no-restricted-syntax': [
      'error',
      ...forbidden('domain-is-pure: take the instant as a parameter, no new Date()', [
        "NewExpression[callee.name='Date'][arguments.length=0]",
      ]),
      ...forbidden('domain-is-pure: take the instant as a parameter, no Date()', [
        "CallExpression[callee.name='Date']",
      ]),
      ...forbidden(
        'domain-is-pure: the zone of the machine is not the zone of the house (use getUTC… or Intl)',
        [
          'CallExpression[callee.property.name=/^(get|set)(FullYear|Month|Date|Day|Hours|Minutes|TimezoneOffset)$/]',
        ],
      ),
      ...forbidden('domain-is-pure: how this machine writes a number or a date is no rule of ours', [
        'CallExpression[callee.property.name=/^toLocale/]',
      ]),
    ],
  },
}

const onScreen =
  '/^(label|title|placeholder|alt|hint|heading|description|caption|legend|aria-(label|description|roledescription|valuetext))$/'
const child = ':matches(JSXElement, JSXFragment) > JSXExpressionContainer'
const text =
  ':matches(Literal[value=/[A-Za-z]{2}/], TemplateLiteral:has(TemplateElement[value.raw=/[A-Za-z]{2}/]))'
const take = 'take the words from shared/messages'
/** Words on screen come from a catalogue in shared/messages, so that a second language is data and not a rewrite. */
const literalText = [
  ...forbidden(`no-literal-text: ${take}`, ['JSXText[value=/[A-Za-z]{2}/]']),
  ...forbidden(`no-literal-text-in-braces: ${take}`, [
    `${child} > ${text}`,
    `${child} > :matches(ConditionalExpression, LogicalExpression) > ${text}`,
  ]),
  ...forbidden(`no-literal-text-in-attributes: ${take}`, [
    `JSXAttribute[name.name=${onScreen}] > ${text}`,
    `JSXAttribute[name.name=${onScreen}] > JSXExpressionContainer > ${text}`,
    `JSXAttribute[name.name=${onScreen}] > JSXExpressionContainer > :matches(ConditionalExpression, LogicalExpression) > ${text}`,
  ]),
]
const laterImports = forbidden(
  'not-in-the-browser: not by import() either; mathjs only in src/lib/arithmetic.ts',
  ['ImportExpression[source.value=/^(node:|(mathjs|express|typeorm|pg)(\\/|$))/]'],
)

/** The last block that matches a file has its way with a rule, so each lists all that holds there. */
export const browserRules = [
  {
    files: ['src/**/*.ts'],
    ignores: ['src/lib/arithmetic.ts'],
    rules: { 'no-restricted-syntax': ['error', ...laterImports] },
  },
  { files: ['src/**/*.tsx'], rules: { 'no-restricted-syntax': ['error', ...laterImports, ...literalText] } },
]

export default tseslint.config(
  { ignores: ['dist/**', '.data/**', 'tests/architecture/canary/**'] },
  ...tseslint.configs.recommended,
  ...importRules(import.meta.dirname),
  domainRules,
  ...browserRules,
  {
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
)
