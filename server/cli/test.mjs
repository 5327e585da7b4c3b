import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs'
import path from 'node:path'
import { ensureChromium } from './chromium.mjs'
import { ensureClientBuild } from './client-build.mjs'
import { ensureDependencies } from './dependencies.mjs'
import { ensurePaperTools } from './paper-tools.mjs'
import { Cluster } from './postgres.mjs'
import { packageProgram, projectRoot } from './project.mjs'
import { runCommand } from './run-command.mjs'
import { stopSignal } from './run-typescript.mjs'
import { countVitest, lockNamesNoHost } from './test-counts.mjs'

/*
 * `npm test`: types, lint, format, lock file and build, each one check, then every test. What follows `--` goes to
 * vitest. Nothing ends the run early, so that one run tells everything; the last line is the sum of it.
 */

const folders = ['src', 'server', 'shared', 'tests']
const stop = stopSignal()
const sum = { passed: 0, failed: 0 }
const notes = []

process.chdir(projectRoot)
await runAll(process.argv.slice(2))
if (stop.aborted) {
  sum.failed += 1
  notes.push('interrupted')
}
for (const note of notes) console.log(`! ${note}`)
const last = `${sum.passed} passed, ${sum.failed} failed\n`
process.stdout.write(last, () => process.exit(sum.failed > 0 ? 1 : 0))

async function runAll(vitestArgs) {
  const say = (line) => console.log(`  ${line}`)
  if (!(await provide('dependencies', () => ensureDependencies(projectRoot, { say, signal: stop })))) return
  await inTurn(2, [
    () => check('types', ['typescript-native/bin/tsc', '-b']),
    () => check('lint', ['eslint/bin/eslint.js', '--max-warnings', '0', ...folders]),
    () => check('format', ['prettier/bin/prettier.cjs', '--check', '--log-level', 'warn', ...folders]),
    () => verdict('lock file', lockNamesNoHost(readFileSync('package-lock.json', 'utf8')), 'it names a host'),
    () => build(say),
  ])
  const env = { ...process.env, NODE_ENV: '' }
  // the settings of a person's own installation are no part of a test
  for (const name of [
    'DATABASE_URL',
    'SESSION_SECRET',
    'SMTP_URL',
    'PUBLIC_URL',
    'PORT',
    'HOST',
    'LOG_LEVEL',
  ])
    delete env[name]
  for (const name of Object.keys(env)) if (/^PRATIQUE_|^PG/.test(name) && name !== 'PG_BIN') delete env[name]
  const chromium = await provide('Chromium', () => ensureChromium(say))
  if (chromium) env.CHROMIUM = chromium
  await provide('PDF tools', () => ensurePaperTools(say))
  const cluster = await provide('PostgreSQL', async () => (await Cluster.throwaway({ say })).start())
  try {
    if (cluster) env.PRATIQUE_TEST_PG = cluster.url('postgres')
    // without a database its projects would end vitest before any other test is run
    const without = cluster || vitestArgs.length > 0 ? [] : ['--project', 'pure', '--project', 'client']
    await vitest([...without, ...vitestArgs], env, vitestArgs.length === 0)
  } finally {
    await cluster?.stop()
  }
}

/** Something the tests need. It counts only when it cannot be had. */
async function provide(name, make) {
  if (stop.aborted) return undefined
  try {
    return await make()
  } catch (error) {
    await verdict(name, false, error.message)
    return undefined
  }
}

async function check(name, [program, ...args]) {
  if (stop.aborted) return
  const { code, output } = await runCommand(process.execPath, [packageProgram(program), ...args], {
    signal: stop,
  })
  verdict(name, code === 0, output)
}

async function build(say) {
  if (stop.aborted) return
  try {
    await ensureClientBuild(projectRoot, { say, signal: stop })
    verdict('build', true)
  } catch (error) {
    verdict('build', false, error.message)
  }
}

function verdict(name, good, why = '') {
  if (stop.aborted) return
  sum[good ? 'passed' : 'failed'] += 1
  console.log(`${good ? '✓' : '✗'} ${name}`)
  if (good) return
  console.log(why)
  notes.push(`${name} failed`)
}

async function inTurn(width, tasks) {
  const queue = [...tasks]
  const worker = async () => {
    for (let task = queue.shift(); task; task = queue.shift()) await task()
  }
  await Promise.all(Array.from({ length: width }, worker))
}

async function vitest(args, env, whole) {
  if (stop.aborted) return
  const file = path.resolve('.data/vitest.json')
  mkdirSync(path.dirname(file), { recursive: true })
  rmSync(file, { force: true })
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`]
  const program = [packageProgram('vitest/vitest.mjs'), 'run', ...reporters, ...args]
  const { code } = await runCommand(process.execPath, program, { env, stdio: 'inherit', signal: stop })
  if (stop.aborted) return
  const report = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null
  const counts = countVitest(report, code, { whole })
  sum.passed += counts.passed
  sum.failed += counts.failed
  notes.push(...counts.notes)
}
