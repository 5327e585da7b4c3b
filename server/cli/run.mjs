import { existsSync } from 'node:fs'
import { ensureDependencies } from './dependencies.mjs'
import { openDatabase } from './own-database.mjs'
import { enterProject, projectRoot } from './project.mjs'
import { Advice } from './run-command.mjs'
import { runTypeScript, stopSignal } from './run-typescript.mjs'

/*
 * Runs a command-line program of the server: node server/cli/run.mjs [--without-database] server/cli/x.ts args…
 * Its output is the program's alone; what is said here goes to stderr, so that the output can be piped.
 */

const stop = stopSignal()
const say = (line) => console.error(line)

/** @type {Awaited<ReturnType<typeof openDatabase>> | undefined} */
let database
let code = 1
try {
  enterProject()
  const args = process.argv.slice(2)
  const withDatabase = args[0] !== '--without-database'
  if (!withDatabase) args.shift()
  const [script, ...rest] = args
  if (!script || !existsSync(script))
    throw new Advice(
      `There is no program ${script ?? 'named'}.`,
      'node server/cli/run.mjs server/cli/<program>.ts',
    )
  await ensureDependencies(projectRoot, { say, signal: stop })
  if (withDatabase) database = await openDatabase(say)
  if (!stop.aborted)
    code = await runTypeScript(script, rest, { env: { NODE_ENV: 'production', ...database?.env }, stop })
} catch (error) {
  if (!stop.aborted) console.error(error instanceof Advice ? error.message : error.stack)
}
await database?.release()
process.exit(stop.aborted && code === 1 ? 130 : code)
