import { spawn } from 'node:child_process'
import { chmodSync, cpSync, mkdtempSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { measureApi } from './benchmark-api.mjs'
import { measureFirstScreen } from './benchmark-page.mjs'
import { ensureChromium } from './chromium.mjs'
import { freePort } from './free-port.mjs'
import { percentile } from './percentile.mjs'
import { projectRoot } from './project.mjs'

/*
 * `npm run benchmark`: how long a fresh copy of the project takes to its first page, and how fast it is then. Each
 * figure stands beside its limit; the exit code is 1 when one is over it. Not part of `npm test`: a figure that hangs
 * on what else the machine does is no test.
 */

const limits = { coldSeconds: 120, warmSeconds: 10, scriptKb: 150, pdfMs: 150, listMs: 50 }
const left = ['node_modules', 'dist', '.data', '.git', '.env']
let overLimit = 0

const copy = mkdtempSync(path.join(os.tmpdir(), 'pratique-benchmark-'))
try {
  chmodSync(copy, 0o711)
  const isWanted = (file) =>
    !left.includes(path.relative(projectRoot, file)) && !file.endsWith('.tsbuildinfo')
  cpSync(projectRoot, copy, { recursive: true, filter: isWanted })
  await ensureChromium(console.log)
  const cold = await start()
  line('cold start to first page', cold.seconds, 's', limits.coldSeconds)
  // the browser's part in the first page belongs to this machine and is told without a limit
  const screen = await measureFirstScreen(cold.url)
  line('first screen: script, gzip', screen.scriptBytes / 1000, 'kB', limits.scriptKb)
  line('first screen: styles, gzip', screen.styleBytes / 1000, 'kB')
  line('first screen: fonts', screen.fontBytes / 1000, 'kB')
  line('first screen: shown after', screen.ms, 'ms')
  await cold.stop()
  const warm = []
  let last = await start()
  for (let round = 1; round < 3; round += 1) {
    warm.push(last.seconds)
    await last.stop()
    last = await start()
  }
  warm.push(last.seconds)
  line('warm start to first page', percentile(warm, 0.5), 's', limits.warmSeconds)
  for (const { address, kind, p50, p95 } of await measureApi(last.url, last.accounts())) {
    if (kind === 'pdf') line(`${address} (median)`, p50, 'ms', limits.pdfMs)
    else line(`${address} (p95)`, p95, 'ms', kind === 'list' ? limits.listMs : undefined)
  }
  await last.stop()
} finally {
  rmSync(copy, { recursive: true, force: true, maxRetries: 5 })
}
process.exitCode = overLimit > 0 ? 1 : 0

function line(what, value, unit, limit) {
  const good = limit === undefined || value <= limit
  if (!good) overLimit += 1
  const against = limit === undefined ? '' : `  limit ${limit} ${unit}${good ? '' : '  OVER'}`
  console.log(`${what.padEnd(46)}${value.toFixed(1).padStart(8)} ${unit}${against}`)
}

/** `npm start` in the copy, until the first page and its script have come. */
async function start() {
  const port = await freePort()
  const url = `http://127.0.0.1:${port}`
  const env = { ...process.env, PORT: String(port), HOST: '127.0.0.1', PRATIQUE_DEMO: '1', LOG_LEVEL: 'warn' }
  for (const name of ['DATABASE_URL', 'PRATIQUE_DATA', 'PUBLIC_URL', 'NODE_ENV', 'npm_lifecycle_event'])
    delete env[name]
  const begun = performance.now()
  const child = spawn(process.execPath, ['server/cli/start.mjs'], { cwd: copy, env })
  let said = ''
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (chunk) => (said += chunk))
  const ended = new Promise((resolve) => child.on('exit', resolve))
  const failed = ended.then((code) => {
    throw new Error(`npm start ended with code ${code}:\n${said}`)
  })
  failed.catch(() => {}) // heard below while it starts; later it is asked to end
  await Promise.race([firstPage(url), failed])
  const seconds = (performance.now() - begun) / 1000
  const stop = async () => {
    child.kill('SIGTERM')
    await ended
  }
  // read when asked for: the server names the accounts just after it begins to listen
  const accounts = () => ({
    password: /password (\S+):/.exec(said)?.[1] ?? '',
    emails: said.match(/\S+@\S+/g) ?? [],
  })
  return { url, seconds, accounts, stop }
}

async function firstPage(url) {
  for (;;) {
    try {
      const page = await (await fetch(url)).text()
      const script = /<script[^>]+src="([^"]+)"/.exec(page)?.[1]
      if (script && (await fetch(url + script)).status === 200) return
    } catch {
      // it does not listen yet
    }
    await new Promise((resolve) => setTimeout(resolve, 50))
  }
}
