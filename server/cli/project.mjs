import { existsSync } from 'node:fs'
import path from 'node:path'
import { Advice } from './run-command.mjs'

export const projectRoot = path.resolve(import.meta.dirname, '../..')

/** Goes to the top of the project and takes in `.env`; what the environment says already goes before it. */
export function enterProject() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
  if (major < 20 || (major === 20 && minor < 19))
    throw new Advice(
      `Pratique needs Node 20.19 or newer; this is ${process.versions.node}.`,
      'install Node 20 or newer',
    )
  process.chdir(projectRoot)
  if (existsSync('.env')) process.loadEnvFile('.env')
}

/** Where the installation keeps what is its own: the database, keys, uploads. */
export function dataFolder() {
  return path.resolve(projectRoot, process.env.PRATIQUE_DATA || '.data')
}

/** A program of an installed package, to be run by this same Node. @param {string} file */
export function packageProgram(file) {
  return path.join(projectRoot, 'node_modules', file)
}
