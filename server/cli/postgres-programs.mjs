import { existsSync, readFileSync, readdirSync, realpathSync, statSync } from 'node:fs'
import path from 'node:path'
import { aptInstall } from './apt-install.mjs'
import { Advice, runCommand } from './run-command.mjs'

/** The account the server runs under when we are root, since it refuses to run as root. */
export function accountForServer() {
  const accounts = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'))
  for (const name of ['postgres', 'nobody']) {
    const line = accounts.find((each) => each[0] === name)
    if (line) return { name, uid: Number(line[2]), gid: Number(line[3]) }
  }
  throw new Advice(
    'PostgreSQL does not run as root, and there is no account "postgres".',
    'run as another user',
  )
}

/** @param {string} file */
export function ownerOf(file) {
  const { uid, gid } = statSync(file)
  return { uid, gid }
}

/** @param {(line: string) => void} say */
export async function findOrInstallPrograms(say) {
  const there = await findPrograms()
  if (there.length > 0) return there
  await aptInstall(['postgresql'], {
    say,
    otherwise: 'set PG_BIN to the folder of its initdb and pg_ctl, or DATABASE_URL to a database of your own',
  })
  const installed = await findPrograms()
  if (installed.length > 0) return installed
  throw new Advice(
    'PostgreSQL was installed, but its initdb was not found.',
    'set PG_BIN to the folder that holds it',
  )
}

/** Folders that hold initdb, pg_ctl and postgres together, best first, each with its major version. */
async function findPrograms() {
  const folders = []
  if (process.env.PG_BIN) folders.push(process.env.PG_BIN)
  for (const folder of (process.env.PATH ?? '').split(path.delimiter)) {
    const program = path.join(folder, 'pg_ctl')
    if (folder && existsSync(program)) folders.push(path.dirname(realpathSync(program)))
  }
  const debian = '/usr/lib/postgresql'
  const versions = existsSync(debian) ? readdirSync(debian) : []
  versions.sort((a, b) => Number(b) - Number(a))
  folders.push(...versions.map((version) => path.join(debian, version, 'bin')))
  const found = []
  for (const folder of new Set(folders)) {
    if (!['initdb', 'pg_ctl', 'postgres'].every((program) => existsSync(path.join(folder, program)))) continue
    const { code, output } = await runCommand(path.join(folder, 'postgres'), ['--version'], { cwd: '/' })
    const version = /\d+/.exec(output)?.[0]
    if (code === 0 && version) found.push({ folder, version })
  }
  return found
}
