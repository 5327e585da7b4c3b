import { spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { ensureClientBuild } from '../../server/cli/client-build.mjs'
import { freePort } from '../../server/cli/free-port.mjs'
import { projectRoot } from '../support/project-files.ts'

// The real `npm start` with a data folder of its own: what a person sees who starts, stops or kills it.

interface Started {
  child: ChildProcess
  said: () => string
  ended: Promise<number | null>
}

let data = ''
let port = 0
const running: Started[] = []

beforeAll(async () => {
  data = mkdtempSync(path.join(os.tmpdir(), 'pratique-start-test-'))
  chmodSync(data, 0o711)
  port = await freePort()
  await ensureClientBuild(projectRoot) // `npm test` has done it; alone, it is not to count as time of the start
}, 300_000)

afterEach(async () => {
  for (const { child, ended } of running.splice(0)) {
    child.kill('SIGTERM')
    await ended
  }
})

afterAll(() => rmSync(data, { recursive: true, force: true }))

function run(command: string, args: string[]): Started {
  const env = {
    ...process.env,
    PRATIQUE_DATA: data,
    PORT: String(port),
    HOST: '127.0.0.1',
    DATABASE_URL: '',
    NODE_ENV: '',
  }
  const child = spawn(command, args, { cwd: projectRoot, env: { ...env, npm_lifecycle_event: '' } })
  let output = ''
  child.stdout.on('data', (chunk) => (output += String(chunk)))
  child.stderr.on('data', (chunk) => (output += String(chunk)))
  const ended = new Promise<number | null>((resolve) => child.on('exit', (code) => resolve(code)))
  const started = { child, said: () => output, ended }
  running.push(started)
  return started
}

const start = () => run(process.execPath, ['server/cli/start.mjs'])

async function until(what: string, seconds: number, isSo: () => boolean | Promise<boolean>): Promise<void> {
  for (const deadline = Date.now() + seconds * 1000; Date.now() < deadline; await sleep(50))
    if (await isSo()) return
  throw new Error(`not within ${seconds} s: ${what}\n${running.map((each) => each.said()).join('\n---\n')}`)
}

const isReady = () =>
  fetch(`http://127.0.0.1:${port}/api/ready`).then(
    (answer) => answer.status === 200,
    () => false,
  )
const ready = () => until('the server answers', 180, isReady)
const portFree = () => until('the port is free', 12, async () => !(await isReady()))
const databaseRuns = () => existsSync(path.join(data, 'pg/postmaster.pid'))
const databasePid = () => Number(readFileSync(path.join(data, 'pg/postmaster.pid'), 'utf8').split('\n')[0])

/** Process numbers of the children of a process, as the system lists them. */
function childrenOf(pid: number): number[] {
  return readFileSync(`/proc/${pid}/task/${pid}/children`, 'utf8').split(' ').filter(Boolean).map(Number)
}

describe('npm start', { timeout: 240_000 }, () => {
  it('begins with an empty folder, serves, and at SIGTERM stops everything with exit code 0', async () => {
    const { child, said, ended } = start()
    await ready()
    expect(said()).toContain('creating the database')
    expect(said()).toContain(`http://127.0.0.1:${port}`)
    expect(databaseRuns()).toBe(true)
    child.kill('SIGTERM')
    expect(await ended).toBe(0)
    expect(said().trimEnd()).toMatch(/stopped, database too$/)
    expect(databaseRuns()).toBe(false)
  })

  it('a second one finds the port taken, says so, and leaves the database of the first alone', async () => {
    start()
    await ready()
    const second = start()
    expect(await second.ended).toBe(1)
    expect(second.said()).toMatch(/port is taken/i)
    expect(await isReady()).toBe(true)
  })

  it('killed outright, it leaves no server behind, and the next one starts', async () => {
    const first = start()
    await ready()
    first.child.kill('SIGKILL')
    await first.ended
    await portFree()
    const second = start()
    await ready()
    second.child.kill('SIGINT')
    expect(await second.ended).toBe(0)
    expect(databaseRuns()).toBe(false)
  })

  it('when npm is killed outright, nothing of it lives on', async () => {
    const npm = run('npm', ['start'])
    await ready()
    npm.child.kill('SIGKILL')
    await portFree()
    await until('the database is stopped', 15, () => !databaseRuns())
  })

  it('after the machine went down (everything killed at once) it starts again', async () => {
    const first = start()
    await ready()
    const server = childrenOf(first.child.pid ?? 0)
    for (const pid of [databasePid(), ...server, first.child.pid ?? 0]) process.kill(pid, 'SIGKILL')
    await first.ended
    expect(databaseRuns()).toBe(true) // its file, that is: it could not clear up
    start()
    await ready()
  })

  it('when the server is killed, it ends with a failure and stops the database', async () => {
    const { child, ended } = start()
    await ready()
    for (const pid of childrenOf(child.pid ?? 0)) process.kill(pid, 'SIGKILL')
    expect(await ended).not.toBe(0)
    expect(databaseRuns()).toBe(false)
  })
})

describe('a command-line program', { timeout: 240_000 }, () => {
  const program = () => {
    const script = path.join(data, 'program.ts')
    writeFileSync(
      script,
      `const { DATABASE_URL, PRATIQUE_OWN_CLUSTER, PRATIQUE_DATA } = process.env
       console.log(JSON.stringify({ own: PRATIQUE_OWN_CLUSTER, url: DATABASE_URL, data: PRATIQUE_DATA, args: process.argv.slice(2) }))
       process.exitCode = 3 as number`,
    )
    return script
  }

  it('gets the database, its arguments and its own exit code, and the database stops with it', async () => {
    const { ended, said } = run(process.execPath, ['server/cli/run.mjs', program(), 'one', '--two'])
    expect(await ended).toBe(3)
    const told = JSON.parse(said()) as { own: string; url: string; data: string; args: string[] }
    expect(told).toMatchObject({ own: '1', data, args: ['one', '--two'] })
    expect(told.url).toMatch(/^postgresql:\/\/pratique:.+@127\.0\.0\.1:\d+\/pratique$/)
    expect(databaseRuns()).toBe(false)
  })

  it('beside a running server it leaves the database running', async () => {
    start()
    await ready()
    const { ended } = run(process.execPath, ['server/cli/run.mjs', program()])
    expect(await ended).toBe(3)
    expect(await isReady()).toBe(true)
  })

  it('that needs no database does not start one', async () => {
    const { ended, said } = run(process.execPath, ['server/cli/run.mjs', '--without-database', program()])
    expect(await ended).toBe(3)
    expect((JSON.parse(said()) as { url?: string }).url).toBe('')
  })

  it('that does not exist is named', async () => {
    const { ended, said } = run(process.execPath, ['server/cli/run.mjs', 'server/cli/no-such.ts'])
    expect(await ended).toBe(1)
    expect(said()).toContain('There is no program server/cli/no-such.ts')
  })
})
