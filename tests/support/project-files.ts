import { execFileSync } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import path from 'node:path'

export const projectRoot = path.resolve(import.meta.dirname, '../..')

/**
 * The files of the project, by path from its top: those git tracks and those it would take in, so that a fault is
 * found before it is committed. The checkout may belong to another account (a container), which git must be told.
 */
export function projectFiles(): string[] {
  const args = ['-c', 'safe.directory=*', 'ls-files', '-z', '--cached', '--others', '--exclude-standard']
  const listed = execFileSync('git', args, {
    cwd: projectRoot,
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  })
  return [...new Set(listed.split('\0'))]
    .filter((file) => file && existsSync(path.join(projectRoot, file)))
    .sort()
}

/** The text of a project file; '' for one that is not text. */
export function projectText(file: string): string {
  const bytes = readFileSync(path.join(projectRoot, file))
  return bytes.includes(0) ? '' : bytes.toString('utf8')
}
