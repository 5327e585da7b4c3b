import { existsSync } from 'node:fs'
import { aptInstall } from './apt-install.mjs'
import { Advice } from './run-command.mjs'

// Debian's Chromium built without a window of its own: a page opened and closed in it costs a fifth of the processor time
const withoutWindow = '/usr/bin/chromium-headless-shell'
const programs = [withoutWindow, '/usr/bin/chromium']
const otherwise = 'set CHROMIUM to the program file of a Chromium or Chrome'

/** The browser for the tests: $CHROMIUM, else Debian's, without a window where there is one, else ''. */
export function findChromium() {
  const named = process.env.CHROMIUM
  if (!named) return programs.find((program) => existsSync(program)) ?? ''
  if (!existsSync(named))
    throw new Advice(`CHROMIUM names ${named}, which does not exist.`, 'correct it, or leave it empty')
  return named
}

/**
 * As `findChromium`, installing Debian's without a window first. Where that cannot be had, the one with a window is as
 * good, only slower.
 *
 * @param {(line: string) => void} [say]
 */
export async function ensureChromium(say) {
  if (!process.env.CHROMIUM && !existsSync(withoutWindow))
    try {
      await aptInstall(['chromium-headless-shell', 'fonts-liberation'], { say, otherwise })
    } catch (error) {
      if (!findChromium()) throw error
    }
  const found = findChromium()
  if (!found) throw new Advice('Chromium was installed, but its program was not found.', otherwise)
  return found
}
