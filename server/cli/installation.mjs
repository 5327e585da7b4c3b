import { spawn } from 'node:child_process'
import { freePort } from './free-port.mjs'

/**
 * `npm start` with the practice data in a folder that holds the project, until the first page and its script have come.
 *
 * @param {string} folder
 * @param {Record<string, string>} [settings] environment beyond the usual
 */
export async function startInstallation(folder, settings = {}) {
  const port = await freePort()
  const url = `http://127.0.0.1:${port}`
  const env = { ...process.env, PORT: String(port), HOST: '127.0.0.1', PRATIQUE_DEMO: '1', LOG_LEVEL: 'warn' }
  for (const name of ['DATABASE_URL', 'PRATIQUE_DATA', 'PUBLIC_URL', 'NODE_ENV', 'npm_lifecycle_event'])
    delete env[name]
  const begun = performance.now()
  const child = spawn(process.execPath, ['server/cli/start.mjs'], {
    cwd: folder,
    env: { ...env, ...settings },
  })
  let said = ''
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (chunk) => (said += chunk))
  const ended = new Promise((resolve) => child.on('exit', resolve))
  const failed = ended.then((code) => {
    throw new Error(`npm start ended with code ${code}:\n${said}`)
  })
  failed.catch(() => {}) // heard below while it starts; later it is asked to end
  await Promise.race([firstPage(url), failed])
  const seconds = (performance.now() - begun) / 1000
  const stop = async () => {
    child.kill('SIGTERM')
    await ended
  }
  // read when asked for: the server names the accounts just after it begins to listen
  const accounts = () => ({
    password: /password (\S+):/.exec(said)?.[1] ?? '',
    emails: said.match(/\S+@\S+/g) ?? [],
  })
  return { url, seconds, accounts, stop }
}

async function firstPage(url) {
  for (;;) {
    try {
      const page = await (await fetch(url)).text()
      const script = /<script[^>]+src="([^"]+)"/.exec(page)?.[1]
      if (script && (await fetch(url + script)).status === 200) return
    } catch {
      // it does not listen yet
    }
    await new Promise((resolve) => setTimeout(resolve, 50))
  }
}
