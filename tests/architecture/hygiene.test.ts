import { describe, expect, it } from 'vitest'
import { filesByGit, filesByWalking, projectFiles, projectText } from '../support/project-files.ts'

// Words that must not stand anywhere are put together here, so that this file does not hold them.
const word = (...parts: string[]) => parts.join('')
const escaped = (text: string) => text.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&')

const files = projectFiles()
const code = files.filter((file) => /\.(tsx?|m?js)$/.test(file))

/** `file:line: text` of every line that matches. */
function linesWith(pattern: RegExp, among: readonly string[]): string[] {
  return among.flatMap((file) =>
    projectText(file)
      .split('\n')
      .flatMap((line, index) =>
        pattern.test(line) ? [`${file}:${index + 1}: ${line.trim().slice(0, 120)}`] : [],
      ),
  )
}

describe('what the repository holds', () => {
  it('is found without git as with it', () => {
    const walked = new Set(filesByWalking())
    expect((filesByGit() ?? projectFiles()).filter((file) => !walked.has(file))).toEqual([])
    expect([...walked].filter((file) => /^(node_modules|dist|\.data|\.git)\//.test(file))).toEqual([])
  })

  it('at the top, only what has its place there', () => {
    const allowed = [
      ...[
        'README.md',
        'DEVELOPERS.md',
        'package.json',
        'package-lock.json',
        'tsconfig.json',
        'vite.config.ts',
      ],
      ...['tailwind.config.ts', 'index.html', 'eslint.config.js'],
      ...['src', 'server', 'shared', 'tests', 'docs', 'public'],
    ]
    const top = new Set(files.map((file) => file.split('/')[0] ?? ''))
    expect([...top].filter((name) => !name.startsWith('.') && !allowed.includes(name))).toEqual([])
  })

  it('nothing that is made or private', () => {
    const made = /(^|\/)(node_modules|dist|\.data|\.env|.*\.tsbuildinfo|.*\.log)(\/|$)/
    expect(files.filter((file) => made.test(file))).toEqual([])
  })

  it('a lock file that names no host, so that any registry serves', () => {
    const lock = projectText('package-lock.json')
    expect(lock.split('\n').filter((line) => line.includes(word('"res', 'olved"')))).toEqual([])
    expect(lock).toContain('"integrity"')
    expect(projectText('.npmrc')).toMatch(/^omit-lockfile-registry-resolved=true$/m)
  })

  it('exact versions, so that two installs are the same', () => {
    const { version, dependencies, devDependencies } = JSON.parse(projectText('package.json')) as Record<
      'dependencies' | 'devDependencies',
      Record<string, string>
    > & { version: string }
    expect(version).toMatch(/^\d/)
    const versions = Object.entries({ ...dependencies, ...devDependencies })
    expect(versions.length).toBeGreaterThan(20)
    expect(versions.filter(([, each]) => !/^(npm:[a-z-]+@)?\d+\.\d+\.\d+$/.test(each))).toEqual([])
  })
})

describe('what no file says', () => {
  it.each([
    [
      'a package registry',
      [word('registry', '.npm'), word('registry', '.yarn'), word('npm', 'js.org'), word('deb.', 'debian')],
    ],
    [
      'a design paper outside of the project',
      [word('shared/', 'design'), word('shared/', 'reference'), word('seed ', 'document')],
    ],
  ])('%s', (_, words) => {
    expect(linesWith(new RegExp(words.map(escaped).join('|'), 'i'), files)).toEqual([])
  })

  it('a path of the machine it was written on', () => {
    const folders = ['work', 'farm', 'home', 'root', 'Users'].join('|')
    const pattern = new RegExp(`(^|[\\s"'\`(=:,])/(${folders})/`)
    expect(pattern.test(`cd ${word('/wo', 'rk/')}x`)).toBe(true)
    expect(linesWith(pattern, files)).toEqual([])
  })
})

describe('tests that would not be run, and checkers that would not be heard', () => {
  it('no test is singled out, left out or put off', () => {
    const heads = ['it', 'test', 'describe', 'suite'].join('|')
    const tails = ['only', 'skip', 'todo', 'skipIf', 'runIf', 'fails'].join('|')
    const pattern = new RegExp(`\\b(${heads})(\\.\\w+)*\\.(${tails})\\b|\\bx(it|describe)\\(|\\.skip\\(\\)`)
    expect(pattern.test(word('it.', 'only('))).toBe(true)
    expect(linesWith(pattern, code)).toEqual([])
  })

  it('no test is true whatever happens', () => {
    const pattern = new RegExp(`${word('expect', '\\(')}(true|1|'[^']*')\\)\\.`)
    expect(pattern.test(word('expect', '(true).toBe(true)'))).toBe(true)
    expect(linesWith(pattern, code)).toEqual([])
  })

  it('no checker is silenced', () => {
    const pattern = new RegExp(
      word('@ts', '-(ignore|nocheck|expect-error)|eslint', '-disable|prettier', '-ignore'),
    )
    expect(linesWith(pattern, code)).toEqual([])
  })
})
