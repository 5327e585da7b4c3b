import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { fork, spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import pg from 'pg'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { Cluster } from '../../server/cli/postgres.mjs'

// Every test runs real servers in scratch folders; the durable ones keep fsync on, as under `npm start`.

let home = ''
const open: Cluster[] = []
const children: ChildProcess[] = []

beforeAll(() => {
  home = mkdtempSync(path.join(os.tmpdir(), 'pratique-cluster-test-'))
  chmodSync(home, 0o711) // as root the server runs under another account, which must get to its folder
})

afterEach(async () => {
  await Promise.all(children.splice(0).map(killed))
  for (const cluster of open.splice(0)) await cluster.stop()
})

afterAll(() => rmSync(home, { recursive: true, force: true }))

function clusterIn(name: string, said: string[] = []): Cluster {
  const cluster = new Cluster({ folder: path.join(home, name, 'pg'), say: (line) => said.push(line) })
  open.push(cluster)
  return cluster
}

async function ask(url: string, sql: string): Promise<unknown> {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    const { rows } = await client.query<Record<string, unknown>>(sql)
    return rows[0] && Object.values(rows[0])[0]
  } finally {
    await client.end()
  }
}

const postmasterPid = (cluster: Cluster) =>
  Number(readFileSync(path.join(cluster.folder, 'postmaster.pid'), 'utf8').split('\n')[0])

function killed(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return Promise.resolve()
  return new Promise((resolve) => {
    child.once('exit', () => resolve())
    child.kill('SIGKILL')
  })
}

async function killServer(cluster: Cluster): Promise<void> {
  process.kill(postmasterPid(cluster), 'SIGKILL')
}

/** Another process that uses the cluster, as a second `npm start` or `npm run verify` would. */
async function anotherUser(cluster: Cluster): Promise<ChildProcess> {
  const script = path.join(home, 'user.mjs')
  const from = path.resolve(import.meta.dirname, '../../server/cli/postgres.mjs')
  writeFileSync(
    script,
    `import { Cluster } from ${JSON.stringify(from)}
     const cluster = new Cluster({ folder: process.argv[2] })
     await cluster.start()
     process.on('message', async () => { process.send(await cluster.stop()); process.disconnect() })
     process.send('started')`,
  )
  const child = fork(script, [cluster.folder], { execArgv: [] })
  children.push(child)
  await new Promise((resolve) => child.once('message', resolve))
  return child
}

describe('a new cluster', { timeout: 120_000 }, () => {
  it('holds a database in UTF-8, owned by pratique, on the loopback address only', async () => {
    const cluster = await clusterIn('new').start()
    expect(await ask(cluster.url(), 'SELECT current_user')).toBe('pratique')
    expect(await ask(cluster.url(), 'SELECT current_database()')).toBe('pratique')
    expect(await ask(cluster.url(), 'SHOW server_encoding')).toBe('UTF8')
    expect(await ask(cluster.url(), 'SHOW listen_addresses')).toBe('127.0.0.1')
    expect(await ask(cluster.url(), 'SHOW unix_socket_directories')).toBe('')
    expect(await ask(cluster.url(), 'SHOW fsync')).toBe('on')
    expect(await ask(cluster.url(), 'SHOW timezone')).toBe('UTC')
  })

  it('asks for its password, and keeps it from other accounts', async () => {
    const cluster = await clusterIn('new').start()
    const url = new URL(cluster.url())
    url.password = 'guessed'
    await expect(ask(url.href, 'SELECT 1')).rejects.toThrow('password authentication failed')
    expect(statSync(`${cluster.folder}.password`).mode & 0o777).toBe(0o600)
    expect(statSync(cluster.folder).mode & 0o777).toBe(0o700)
  })
})

describe('a cluster that ran before', { timeout: 120_000 }, () => {
  it('keeps its data over stop and start', async () => {
    const first = await clusterIn('used').start()
    await ask(first.url(), 'CREATE TABLE kept AS SELECT 42 AS n')
    expect(await first.stop()).toBe(true)
    expect(existsSync(path.join(first.folder, 'postmaster.pid'))).toBe(false)
    const second = await clusterIn('used').start()
    expect(await ask(second.url(), 'SELECT kept.n FROM kept')).toBe(42)
  })

  it('starts again at once after kill -9, with everything that was committed', async () => {
    const cluster = await clusterIn('used').start()
    await ask(cluster.url(), 'CREATE TABLE committed (n int)')
    for (let round = 1; round <= 3; round += 1) {
      await ask(cluster.url(), `INSERT INTO committed VALUES (${round})`)
      await killServer(cluster) // no pause: the process may still be there for some milliseconds
      await cluster.start()
      expect(await ask(cluster.url(), 'SELECT count(*)::int FROM committed')).toBe(round)
    }
  })

  it('starts again though a session of the killed server was busy', async () => {
    const cluster = await clusterIn('used').start()
    const client = new pg.Client({ connectionString: cluster.url() })
    client.on('error', () => {}) // the connection breaks, as it should
    await client.connect()
    const busy = client.query('SELECT pg_sleep(2)').catch((error: Error) => error)
    await sleep(200)
    await killServer(cluster)
    await cluster.start()
    expect(await ask(cluster.url(), 'SELECT 1')).toBe(1)
    await busy
  })

  it('is not taken in by a stale postmaster.pid whose number another process has now', async () => {
    const cluster = await clusterIn('used').start()
    await cluster.stop()
    const stranger = spawn('sleep', ['30'])
    children.push(stranger)
    const lines = [
      stranger.pid,
      cluster.folder,
      Math.floor(Date.now() / 1000),
      5432,
      '',
      '127.0.0.1',
      '',
      'ready',
    ]
    writeFileSync(path.join(cluster.folder, 'postmaster.pid'), `${lines.join('\n')}\n`, { mode: 0o600 })
    await cluster.start()
    expect(await ask(cluster.url(), 'SELECT 1')).toBe(1)
    expect(stranger.exitCode).toBe(null)
    expect(stranger.signalCode).toBe(null)
  })

  it('is not taken in by a postmaster.pid that was cut off', async () => {
    const cluster = await clusterIn('used').start()
    await cluster.stop()
    writeFileSync(path.join(cluster.folder, 'postmaster.pid'), '', { mode: 0o600 })
    await cluster.start()
    expect(await ask(cluster.url(), 'SELECT 1')).toBe(1)
  })

  it('makes a folder again whose making was cut off', async () => {
    const said: string[] = []
    const cluster = clusterIn('broken', said)
    mkdirSync(path.join(cluster.folder, 'base'), { recursive: true })
    await cluster.start()
    expect(said).toContain('the database folder is incomplete: making it again')
    expect(await ask(cluster.url(), 'SELECT 1')).toBe(1)
  })

  it('says what to do when the data is of another version of PostgreSQL', async () => {
    const cluster = clusterIn('old')
    mkdirSync(cluster.folder, { recursive: true })
    writeFileSync(path.join(cluster.folder, 'PG_VERSION'), '9\n')
    await expect(cluster.start()).rejects.toThrow(
      /made by PostgreSQL 9; found here: .*\n.*install postgresql-9/,
    )
  })

  it('says what to do when the password file is gone, and does not make a new database', async () => {
    const cluster = await clusterIn('used').start()
    await cluster.stop()
    const file = `${cluster.folder}.password`
    renameSync(file, `${file}.away`)
    await expect(cluster.start()).rejects.toThrow(/password file .* cannot be read/)
    renameSync(`${file}.away`, file)
    await cluster.start()
    expect(await ask(cluster.url(), 'SELECT 1')).toBe(1)
  })
})

describe('a folder that the account of the server cannot reach', { timeout: 120_000 }, () => {
  it('as root the data goes to /var/tmp, and stays there when the way is opened later', async () => {
    const said: string[] = []
    const cluster = clusterIn('closed', said)
    const wanted = cluster.folder
    mkdirSync(path.dirname(wanted), { mode: 0o700 })
    await cluster.start()
    try {
      await ask(cluster.url(), 'CREATE TABLE kept AS SELECT 42 AS n')
      expect(cluster.folder === wanted).toBe(process.getuid?.() !== 0)
      expect(said.some((line) => line.includes('the database is in /var/tmp/'))).toBe(
        process.getuid?.() === 0,
      )
      await cluster.stop()
      chmodSync(path.dirname(wanted), 0o711)
      const again = await clusterIn('closed').start()
      expect(await ask(again.url(), 'SELECT kept.n FROM kept')).toBe(42)
      await again.stop()
    } finally {
      for (const ending of ['', '.password'])
        rmSync(cluster.folder + ending, { recursive: true, force: true })
    }
  })

  it('never makes a new database in place of one that can no longer be reached', async () => {
    const cluster = await clusterIn('used').start()
    await cluster.stop()
    chmodSync(path.dirname(cluster.folder), 0o700)
    const outcome = await cluster.start().then(
      () => 'started',
      (error: Error) => error.message,
    )
    chmodSync(path.dirname(cluster.folder), 0o711)
    expect(outcome).toMatch(process.getuid?.() === 0 ? /can no longer enter .*\n.*chmod o\+x/ : /^started$/)
  })
})

describe('two processes on one cluster', { timeout: 120_000 }, () => {
  it('the second one to start does not take the database away when it leaves', async () => {
    const first = await clusterIn('used').start()
    const second = await anotherUser(first)
    const stopped = new Promise((resolve) => second.once('message', resolve))
    second.send('stop')
    expect(await stopped).toBe(false)
    expect(await ask(first.url(), 'SELECT 1')).toBe(1)
  })

  it('the first one leaves it to the second, which stops it', async () => {
    const first = await clusterIn('used').start()
    const second = await anotherUser(first)
    expect(await first.stop()).toBe(false)
    expect(await ask(first.url(), 'SELECT 1')).toBe(1)
    const stopped = new Promise((resolve) => second.once('message', resolve))
    second.send('stop')
    expect(await stopped).toBe(true)
    await expect(ask(first.url(), 'SELECT 1')).rejects.toThrow('ECONNREFUSED')
  })

  it('one that was killed counts for nothing', async () => {
    const first = await clusterIn('used').start()
    const second = await anotherUser(first)
    await killed(second)
    expect(await first.stop()).toBe(true)
  })

  it('four that start a new one together all get the same database', async () => {
    const wanted = clusterIn('together')
    await Promise.all(Array.from({ length: 4 }, () => anotherUser(wanted)))
    await wanted.start()
    expect(await ask(wanted.url(), 'SELECT 1')).toBe(1)
  })
})

describe('a throwaway cluster', { timeout: 120_000 }, () => {
  it('is fast rather than safe, and leaves nothing behind', async () => {
    const cluster = await Cluster.throwaway()
    await cluster.start()
    expect(await ask(cluster.url(), 'SHOW fsync')).toBe('off')
    await cluster.stop()
    expect(existsSync(path.dirname(cluster.folder))).toBe(false)
  })
})
