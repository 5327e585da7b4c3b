import { createServer } from 'node:net'
import { expect, it } from 'vitest'
import { freePort } from '../../server/cli/free-port.mjs'

it('is one that can be listened on, and that no system hands out by itself', async () => {
  const ports = await Promise.all(Array.from({ length: 20 }, () => freePort()))
  for (const port of ports) expect(port).toBeLessThan(32_768)
  const server = createServer()
  await new Promise<void>((resolve) => server.listen(ports[0], '127.0.0.1', resolve))
  await new Promise((resolve) => server.close(resolve))
})
