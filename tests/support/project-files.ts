import { spawnSync } from 'node:child_process'
import { existsSync, readFileSync, readdirSync } from 'node:fs'
import path from 'node:path'

export const projectRoot = path.resolve(import.meta.dirname, '../..')

/**
 * The files of the project, by path from its top: those git tracks. Where there is no git, or no repository (a copy
 * in a container), all files but those that .gitignore names.
 */
export function projectFiles(): string[] {
  return filesByGit() ?? filesByWalking()
}

/** As git tells it; null without git. The checkout may belong to another account, which git must be told. */
export function filesByGit(): string[] | null {
  const args = ['-c', 'safe.directory=*', 'ls-files', '-z']
  const { status, stdout } = spawnSync('git', args, {
    cwd: projectRoot,
    encoding: 'utf8',
    maxBuffer: 2 ** 26,
  })
  if (status !== 0) return null
  return [...new Set(stdout.split('\0'))]
    .filter((file) => file && existsSync(path.join(projectRoot, file)))
    .sort()
}

/** As the folder tells it. */
export function filesByWalking(): string[] {
  const isIgnored = ignoredNames(projectText('.gitignore'))
  const walk = (folder: string): string[] =>
    readdirSync(path.join(projectRoot, folder), { withFileTypes: true }).flatMap((entry) => {
      if (entry.name === '.git' || isIgnored(entry.name)) return []
      const at = folder ? `${folder}/${entry.name}` : entry.name
      return entry.isDirectory() ? walk(at) : [at]
    })
  return walk('').sort()
}

/** Knows the two kinds of line our .gitignore has, a name and `*.ending`, and refuses any other. */
function ignoredNames(gitignore: string): (name: string) => boolean {
  const lines = gitignore.split('\n').filter((line) => line && !line.startsWith('#'))
  const strange = lines.find((line) => !/^(\*\.)?[\w.-]+$/.test(line))
  if (strange)
    throw new Error(
      `tests/support/project-files.ts does not know this kind of line of .gitignore: ${strange}`,
    )
  return (name) => lines.some((line) => (line.startsWith('*') ? name.endsWith(line.slice(1)) : name === line))
}

/** The text of a project file; '' for one that is not text. */
export function projectText(file: string): string {
  const bytes = readFileSync(path.join(projectRoot, file))
  return bytes.includes(0) ? '' : bytes.toString('utf8')
}
