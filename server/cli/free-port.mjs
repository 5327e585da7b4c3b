import { randomInt } from 'node:crypto'
import { createServer } from 'node:net'

/** Below every range that systems hand ports out of by themselves (Linux from 32768, the standard from 49152). */
const lowest = 20_000
const highest = 32_000
const tries = 100

const isFree = (port) =>
  new Promise((resolve) => {
    const server = createServer()
    server.on('error', () => resolve(false))
    server.listen(port, '127.0.0.1', () => server.close(() => resolve(true)))
  })

/**
 * A port of the loopback address that nobody listens on now. It is one that the system gives to nobody who asks for any
 * port: between this answer and its use no other program comes by it unasked.
 *
 * @returns {Promise<number>}
 */
export async function freePort() {
  for (let left = tries; left > 0; left -= 1) {
    const port = randomInt(lowest, highest)
    if (await isFree(port)) return port
  }
  throw new Error(`No free port found between ${lowest} and ${highest} on 127.0.0.1`)
}
