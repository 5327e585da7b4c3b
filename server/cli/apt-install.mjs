import { Advice, runCommand, tail } from './run-command.mjs'

/**
 * Installs Debian packages, as root or through `sudo` without a question.
 *
 * Debian's PostgreSQL package makes and starts a cluster of its own unless told not to before it is unpacked;
 * that cluster would hold memory and port 5432 for nothing, so that is said first.
 *
 * @param {string[]} packages
 * @param {{ say?: (line: string) => void, otherwise: string }} options `otherwise`: what a person can do instead
 */
export async function aptInstall(packages, { say = () => {}, otherwise }) {
  const names = packages.join(' ')
  const asRoot = process.getuid?.() === 0
  const byHand = `install ${names} yourself (Debian: apt-get install ${names}), or ${otherwise}`
  if ((await runCommand('apt-get', ['--version'])).code !== 0)
    throw new Advice(`${names} is missing, and this system has no apt-get to install it with.`, byHand)
  if (!asRoot && (await runCommand('sudo', ['-n', 'true'])).code !== 0)
    throw new Advice(`${names} is missing, and this account may not install packages.`, byHand)
  say(`installing ${names} (once, about a minute)`)
  const script = [
    'set -e',
    'mkdir -p /etc/postgresql-common/createcluster.d',
    "echo 'create_main_cluster = false' > /etc/postgresql-common/createcluster.d/no-main.conf",
    'apt-get update -qq',
    `DEBIAN_FRONTEND=noninteractive apt-get install -y -qq --no-install-recommends ${names}`,
  ].join('\n')
  const [command, ...args] = [...(asRoot ? [] : ['sudo', '-n']), 'sh', '-c', script]
  const { code, output } = await runCommand(command, args)
  if (code !== 0) throw new Advice(`Installing ${names} failed:\n${tail(output)}`, byHand)
}
