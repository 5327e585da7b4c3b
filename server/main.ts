import { ConfigError, readConfig } from './config.ts'
import { demoAccountLines } from './demo/seed-demo.ts'
import { systemClock } from './platform/clock.ts'
import { startServer } from './start-server.ts'

async function main(): Promise<void> {
  const config = readConfig(process.env)
  const server = await startServer(config, systemClock)
  const lines = [`Pratique is ready at ${server.url}`, ...(config.demo ? demoAccountLines() : [])]
  process.stdout.write(`\n${lines.join('\n')}\n`)

  let stopping = false
  const stop = () => {
    // The terminal sends Ctrl-C to every process of the group, so a second signal is usual
    if (stopping) return
    stopping = true
    const limit = setTimeout(() => process.exit(1), 10_000)
    server.stop().then(
      () => {
        clearTimeout(limit)
        process.exit(0)
      },
      () => process.exit(1),
    )
  }
  process.on('SIGINT', stop)
  process.on('SIGTERM', stop)
}

function explain(error: unknown): string {
  if (error instanceof ConfigError) return error.message
  const { code, message } = error as { code?: string; message?: string }
  if (code === 'EADDRINUSE')
    return 'The port is taken. Stop the other program, or choose another: PORT=4401 npm start'
  if (code === 'ECONNREFUSED')
    return 'The database does not answer. Check DATABASE_URL and that PostgreSQL runs.'
  return message ?? String(error)
}

main().catch((error: unknown) => {
  process.stderr.write(`\nPratique could not start: ${explain(error)}\n`)
  process.exit(1)
})
