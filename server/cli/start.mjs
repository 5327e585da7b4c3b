import { ensureClientBuild } from './client-build.mjs'
import { ensureDependencies } from './dependencies.mjs'
import { openDatabase } from './own-database.mjs'
import { enterProject, projectRoot } from './project.mjs'
import { Advice } from './run-command.mjs'
import { runTypeScript, stopSignal } from './run-typescript.mjs'

/*
 * `npm start`, and `npm run dev` with --dev. From a fresh clone to a running server: dependencies, database, client,
 * server. Each step is skipped when its work is done already.
 */

const dev = process.argv.includes('--dev')
const stop = stopSignal()
const report = (step, line) => console.log(`  ${step.padEnd(14)}${line}`)

/** @type {Awaited<ReturnType<typeof openDatabase>> | undefined} */
let database
let code = 1
try {
  enterProject()
  console.log(dev ? 'Pratique, for development' : 'Pratique')
  code = await start()
} catch (error) {
  if (stop.aborted) code = 0
  else console.error(`\n${error instanceof Advice ? error.message : error.stack}`)
}
const stopped = await database?.release()
if (stop.aborted) console.log(stopped ? 'stopped, database too' : 'stopped')
process.exit(stop.aborted && code > 127 ? 0 : code) // ended by the signal that we were asked to pass on

async function start() {
  const step = (name) => ({ say: (line) => report(name, line), signal: stop })
  report('dependencies', await ensureDependencies(projectRoot, step('dependencies')))
  if (stop.aborted) return 0
  database = await openDatabase((line) => report('database', line))
  report('database', database.description)
  if (stop.aborted) return 0
  if (!dev) report('client', await ensureClientBuild(projectRoot, step('client')))
  if (stop.aborted) return 0
  report('server', 'starting')
  const env = { ...database.env, NODE_ENV: dev ? 'development' : 'production' }
  return runTypeScript('server/main.ts', [], { env, stop })
}
