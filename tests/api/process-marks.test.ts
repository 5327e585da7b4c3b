import { spawn } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { hasForeignMarks, leaveMark, livingMarks, removeMark } from '../../server/cli/process-marks.mjs'

let folder = ''

beforeEach(() => {
  folder = path.join(mkdtempSync(path.join(os.tmpdir(), 'pratique-marks-')), 'users')
})

afterEach(() => rmSync(path.dirname(folder), { recursive: true, force: true }))

it('counts the living, and forgets who has left or died', async () => {
  const other = spawn('sleep', ['60'])
  const pid = other.pid ?? 0
  leaveMark(folder)
  leaveMark(folder, pid)
  expect(livingMarks(folder).sort()).toEqual([process.pid, pid].sort())
  other.kill('SIGKILL')
  await new Promise((resolve) => other.once('exit', resolve))
  expect(livingMarks(folder)).toEqual([process.pid])
  removeMark(folder)
  expect(livingMarks(folder)).toEqual([])
})

it('is not taken in by a number that the system gave to another process since', () => {
  leaveMark(folder)
  const file = path.join(folder, String(process.pid))
  const [namespace] = readFileSync(file, 'utf8').split(' ')
  writeFileSync(file, `${namespace} 1`)
  expect(livingMarks(folder)).toEqual([])
})

it('does not judge a mark made in another container, and does not count it', () => {
  leaveMark(folder)
  writeFileSync(path.join(folder, '1'), 'pid:[1] 1')
  expect(livingMarks(folder)).toEqual([process.pid])
  expect(hasForeignMarks(folder)).toBe(true)
  removeMark(folder, 1)
  expect(hasForeignMarks(folder)).toBe(false)
})
