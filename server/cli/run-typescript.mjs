import { spawn } from 'node:child_process'
import { projectRoot } from './project.mjs'

/**
 * Runs a TypeScript program with tsx in a process of its own, passes signals on to it and waits for its end.
 *
 * tsx reads only the tsconfig.json of the working folder unless told, and without the one of the server the
 * decorators of the entities do not compile.
 *
 * @param {string} script
 * @param {string[]} args
 * @param {{ env: Record<string, string>, stop: AbortSignal }} options
 * @returns {Promise<number>} its exit code; 128 when a signal ended it
 */
export function runTypeScript(script, args, { env, stop }) {
  const nodeArgs = ['--import', 'tsx', '--import', './server/cli/follow-parent.mjs', script, ...args]
  const child = spawn(process.execPath, nodeArgs, {
    cwd: projectRoot,
    env: { ...process.env, TSX_TSCONFIG_PATH: 'server/tsconfig.json', ...env },
    stdio: ['inherit', 'inherit', 'inherit', 'ipc'],
  })
  const pass = () => child.kill('SIGTERM')
  if (stop.aborted) pass()
  stop.addEventListener('abort', pass)
  return new Promise((resolve, reject) => {
    child.on('error', reject)
    child.on('exit', (code) => resolve(code ?? 128))
  })
}

/**
 * Turns the signals that ask a program to end into one AbortSignal. A killed npm asks nothing: its end shows by a new
 * parent, and is taken as the same wish, so that nothing is left holding the port.
 */
export function stopSignal() {
  const controller = new AbortController()
  for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, () => controller.abort())
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {}) // the terminal may be gone
  if (process.env.npm_lifecycle_event) {
    const parent = process.ppid
    setInterval(() => process.ppid !== parent && controller.abort(), 500).unref()
  }
  return controller.signal
}
