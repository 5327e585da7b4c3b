import { existsSync } from 'node:fs'
import { aptInstall } from './apt-install.mjs'
import { Advice } from './run-command.mjs'

const debian = '/usr/bin/chromium'
const otherwise = 'set CHROMIUM to the program file of a Chromium or Chrome'

/** The browser for the tests: $CHROMIUM, else Debian's, else ''. */
export function findChromium() {
  const named = process.env.CHROMIUM
  if (!named) return existsSync(debian) ? debian : ''
  if (!existsSync(named))
    throw new Advice(`CHROMIUM names ${named}, which does not exist.`, 'correct it, or leave it empty')
  return named
}

/** As `findChromium`, installing Debian's when there is none. @param {(line: string) => void} [say] */
export async function ensureChromium(say) {
  if (!findChromium()) await aptInstall(['chromium', 'fonts-liberation'], { say, otherwise })
  const found = findChromium()
  if (!found) throw new Advice('Chromium was installed, but its program was not found.', otherwise)
  return found
}
