import { expect, it } from 'vitest'
import { runCommand } from '../../server/cli/run-command.mjs'

it('gives the exit code and all that was said', async () => {
  const { code, output } = await runCommand('sh', ['-c', 'echo out; echo err >&2; exit 3'])
  expect(code).toBe(3)
  expect(output.split('\n').sort()).toEqual(['', 'err', 'out'])
})

it('answers 127 for a program that does not exist, as a shell would', async () => {
  expect((await runCommand('no-such-program', [])).code).toBe(127)
})

it('asked to end, waits until the program has put its things in order', async () => {
  const controller = new AbortController()
  const script = 'trap "sleep 0.3; echo in order; exit 5" TERM; sleep 3 & wait'
  const running = runCommand('bash', ['-c', script], { signal: controller.signal })
  setTimeout(() => controller.abort(), 500)
  const { code, output } = await running
  expect(code).toBe(5)
  expect(output).toContain('in order')
})
