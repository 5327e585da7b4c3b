import { spawn } from 'node:child_process'

/**
 * Runs one program to its end and never throws: a program that cannot be started answers code 127.
 *
 * `stdio: 'ignore'` is for a command that leaves a daemon behind (`pg_ctl start`): with pipes the daemon
 * inherits them and the command never seems to end.
 *
 * @param {string} command
 * @param {string[]} args
 * @param {import('node:child_process').SpawnOptions} [options] stdio 'pipe' (default) collects the output
 * @returns {Promise<{ code: number, output: string }>}
 */
export function runCommand(command, args, options = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options })
    let output = ''
    child.stdout?.on('data', (chunk) => (output += chunk))
    child.stderr?.on('data', (chunk) => (output += chunk))
    child.on('error', (error) => {
      if (error.name !== 'AbortError') return resolve({ code: 127, output: error.message })
      // asked to end by `signal`, it is given time to end well; what it started itself is not waited for
      const limit = setTimeout(() => child.kill('SIGKILL'), 10_000)
      child.on('exit', (code) => {
        clearTimeout(limit)
        resolve({ code: code ?? 128, output })
      })
    })
    child.on('close', (code, signal) =>
      resolve({ code: code ?? 128, output: signal ? `${output}\n${signal}` : output }),
    )
  })
}

/** A failure that a person at the terminal can act on: what went wrong, and what to do about it. */
export class Advice extends Error {
  /** @param {string} what @param {string} whatToDo */
  constructor(what, whatToDo) {
    super(`${what}\n  What to do: ${whatToDo}`)
    this.name = 'Advice'
  }
}

/** The last lines of a long text, for messages. @param {string} text @param {number} [lines] */
export function tail(text, lines = 12) {
  return text.trimEnd().split('\n').slice(-lines).join('\n')
}
