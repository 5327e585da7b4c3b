import { spawnSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { countVitest, lockNamesNoHost } from '../../server/cli/test-counts.mjs'
import type { VitestReport } from '../../server/cli/test-counts.mjs'
import { projectRoot } from '../support/project-files.ts'

/*
 * `npm test` may only say "0 failed" when that is so. The reports counted here are not imagined: vitest itself
 * writes them over small files that go wrong in each of the ways a run can go wrong.
 */

let folder = ''

beforeAll(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'pratique-counts-'))
  symlinkSync(path.join(projectRoot, 'node_modules'), path.join(folder, 'node_modules'))
  writeFileSync(path.join(folder, 'package.json'), '{ "type": "module" }')
  const files: Record<string, string> = {
    good: `it('one', () => {}); it('two', () => {})`,
    bad: `it('one', () => {}); it('two', () => { throw new Error('two') })`,
    unloadable: `import './is-not-there.ts'; it('one', () => {}); it('two', () => {})`,
    unprepared: `beforeAll(() => { throw new Error('no') }); it('one', () => {}); it('two', () => {})`,
    uncleared: `afterAll(() => { throw new Error('no') }); it('one', () => {})`,
    unhandled: `it('one', async () => { void Promise.reject(new Error('late')); await new Promise((r) => setTimeout(r, 20)) })`,
    unrun: `it('one', () => {}); it('two', (task) => task.${'skip'}()); it.${'todo'}('three')`,
    empty: '',
  }
  for (const [name, text] of Object.entries(files))
    writeFileSync(
      path.join(folder, `${name}.test.js`),
      `import { it, beforeAll, afterAll } from 'vitest'\n${text}\n`,
    )
})

afterAll(() => rmSync(folder, { recursive: true, force: true }))

function runVitest(...names: string[]): { report: VitestReport; code: number } {
  const output = path.join(folder, 'report.json')
  const program = path.join(projectRoot, 'node_modules/vitest/vitest.mjs')
  const options = [
    'run',
    '--root',
    folder,
    '--pool=threads',
    '--reporter=json',
    `--outputFile.json=${output}`,
  ]
  const files = names.map((name) => `${name}.test.js`)
  const { VITEST: _, VITEST_POOL_ID: _pool, VITEST_WORKER_ID: _worker, ...env } = process.env
  const { status } = spawnSync(process.execPath, [program, ...options, ...files], { cwd: folder, env })
  return { report: JSON.parse(readFileSync(output, 'utf8')) as VitestReport, code: status ?? 1 }
}

describe('counting a run of vitest', () => {
  it('counts what passed and what failed, each file that failed as a whole, and what was not run', () => {
    const { report, code } = runVitest('good', 'bad', 'unloadable', 'unprepared', 'uncleared', 'unrun')
    expect(code).toBe(1)
    const counted = countVitest(report, code, { whole: true })
    // passed: good 2, bad 1, uncleared 1, unrun 1; failed: bad 1, three files, two not prepared for, two not run
    expect(counted.passed).toBe(5)
    expect(counted.failed).toBe(1 + 3 + 2 + 2)
    const names = counted.notes.filter((note) => note.endsWith('outside of its tests')).join('\n')
    for (const name of ['unloadable', 'unprepared', 'uncleared']) expect(names).toContain(`${name}.test.js`)
    expect(counted.notes).toContain('4 not run')
    // where only a part was asked for, what was left out is no failure
    expect(countVitest(report, code, { whole: false }).failed).toBe(1 + 3)
  })

  it('counts an error that belongs to no test', () => {
    const { report, code } = runVitest('unhandled')
    expect(report.numFailedTests).toBe(0)
    expect(countVitest(report, code, { whole: true })).toMatchObject({ passed: 1, failed: 1 })
  })

  it('counts a good run as it is', () => {
    const { report, code } = runVitest('good')
    expect(countVitest(report, code, { whole: true })).toEqual({ passed: 2, failed: 0, notes: [] })
  })

  it('counts a file without a test, and a run of no file, as a failure', () => {
    const empty = runVitest('empty')
    expect(countVitest(empty.report, empty.code, { whole: true })).toMatchObject({ passed: 0, failed: 1 })
    const none = {
      numPassedTests: 0,
      numFailedTests: 0,
      numPendingTests: 0,
      numTodoTests: 0,
      testResults: [],
    }
    expect(countVitest(none, 0, { whole: true })).toMatchObject({
      passed: 0,
      failed: 1,
      notes: ['no test was run'],
    })
  })

  it('counts a missing report as a failure', () => {
    expect(countVitest(null, 139, { whole: true })).toMatchObject({ passed: 0, failed: 1 })
  })
})

describe('the lock file check', () => {
  it('finds a host, and is not content with an empty file', () => {
    const entry = '"node_modules/pg": { "version": "8.23.1", "integrity": "sha512-…" }'
    expect(lockNamesNoHost(`{ ${entry} }`)).toBe(true)
    expect(lockNamesNoHost(`{ ${entry}, "${'resolved'}": "https://registry.example/pg.tgz" }`)).toBe(false)
    expect(lockNamesNoHost('')).toBe(false)
  })
})
