import { chmodSync, cpSync, mkdtempSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { measureApi } from './benchmark-api.mjs'
import { measureFirstScreen } from './benchmark-page.mjs'
import { ensureChromium } from './chromium.mjs'
import { startInstallation } from './installation.mjs'
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
  const cold = await startInstallation(copy)
  line('cold start to first page', cold.seconds, 's', limits.coldSeconds)
  // the browser's part in the first page belongs to this machine and is told without a limit
  const screen = await measureFirstScreen(cold.url)
  line('first screen: script, gzip', screen.scriptBytes / 1000, 'kB', limits.scriptKb)
  line('first screen: styles, gzip', screen.styleBytes / 1000, 'kB')
  line('first screen: fonts', screen.fontBytes / 1000, 'kB')
  line('first screen: shown after', screen.ms, 'ms')
  await cold.stop()
  const warm = []
  let last = await startInstallation(copy)
  for (let round = 1; round < 3; round += 1) {
    warm.push(last.seconds)
    await last.stop()
    last = await startInstallation(copy)
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
