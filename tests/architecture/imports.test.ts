import { readFileSync } from 'node:fs'
import path from 'node:path'
import { ESLint } from 'eslint'
import tseslint from 'typescript-eslint'
import { beforeAll, describe, expect, it } from 'vitest'
import { browserRules, domainRules, importRules } from '../../eslint.config.js'

/*
 * A rule that is set up wrongly finds nothing and passes. So the rules are run over canary/, a small tree of the
 * project's shape in which a comment `breaks: <what the rule says>` stands on the line before each planted fault.
 */

const root = path.resolve(import.meta.dirname, '../..')
const canary = path.join(import.meta.dirname, 'canary')
const rules = [...importRules(canary), domainRules, ...browserRules]

interface Fault {
  where: string
  says: string
}

const planted: Fault[] = []
const found: Fault[] = []

beforeAll(async () => {
  const eslint = new ESLint({
    cwd: canary,
    overrideConfigFile: true,
    overrideConfig: [tseslint.configs.base, ...rules] as never,
  })
  for (const { filePath, messages } of await eslint.lintFiles(['.'])) {
    const file = path.relative(canary, filePath)
    for (const { line, ruleId, message } of messages)
      found.push({ where: `${file}:${line}`, says: `${ruleId} ${message}` })
    const lines = readFileSync(filePath, 'utf8').split('\n')
    lines.forEach((text, index) => {
      const says = /^\/\/ breaks: (.+)/.exec(text)?.[1]
      if (says) planted.push({ where: `${file}:${index + 2}`, says })
    })
  }
})

describe('the import rules, the rules of the domain and the rule of words', () => {
  it('find every planted fault', () => {
    const missed = planted.filter(
      (fault) => !found.some((f) => f.where === fault.where && f.says.includes(fault.says)),
    )
    expect(missed).toEqual([])
  })

  it('find nothing where no fault is planted', () => {
    const places = new Set(planted.map((fault) => fault.where))
    expect(found.filter((fault) => !places.has(fault.where))).toEqual([])
  })

  it('have a planted fault each', () => {
    const messages: string[] = []
    JSON.stringify(
      rules.map((block) => block.rules),
      (key, value: unknown) => {
        if (key === 'message') messages.push(String(value))
        return value
      },
    )
    expect(messages.length).toBeGreaterThan(40)
    const named = new Set(['no-cycle', 'consistent-type-imports', ...messages])
    expect(new Set(planted.map((fault) => fault.says))).toEqual(named)
  })
})

describe('the rules in force in the project', () => {
  const severityOf = async (file: string, rule: string) => {
    const config = (await new ESLint({ cwd: root }).calculateConfigForFile(file)) as
      { rules: Record<string, [number, ...unknown[]] | undefined> } | undefined
    return config?.rules[rule]?.[0]
  }

  it.each([
    ['server/main.ts', 'import-x/no-cycle'],
    ['server/main.ts', 'import-x/no-restricted-paths'],
    ['src/main.tsx', 'import-x/no-restricted-paths'],
    ['shared/domain/result.ts', 'import-x/no-cycle'],
    ['shared/domain/result.ts', 'no-restricted-globals'],
    ['shared/domain/result.ts', 'no-restricted-properties'],
    ['shared/domain/result.ts', 'no-restricted-syntax'],
    ['shared/domain/result.ts', 'no-restricted-imports'],
    ['shared/contracts/contract.ts', 'no-restricted-imports'],
    ['src/app/router.tsx', 'no-restricted-syntax'],
    ['src/lib/api-client.ts', 'no-restricted-syntax'],
    ['src/lib/api-client.ts', 'no-restricted-imports'],
    ['server/features/people/people.service.ts', 'no-restricted-imports'],
    ['server/features/people/people.routes.ts', 'no-restricted-imports'],
    ['tests/support/database.ts', '@typescript-eslint/no-explicit-any'],
    ['tests/support/database.ts', '@typescript-eslint/ban-ts-comment'],
  ])('%s is held to %s', async (file, rule) => {
    expect(await severityOf(file, rule)).toBe(2)
  })

  it('cover the whole project: nothing but the canary and what is made is left out', async () => {
    const eslint = new ESLint({ cwd: root })
    for (const file of [
      'src/main.tsx',
      'server/cli/start.mjs',
      'shared/domain/result.ts',
      'tests/support/database.ts',
    ])
      expect(await eslint.isPathIgnored(file), file).toBe(false)
    expect(await eslint.isPathIgnored('tests/architecture/canary/server/app.ts')).toBe(true)
  })
})
