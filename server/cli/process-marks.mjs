import {
  existsSync,
  mkdirSync,
  readFileSync,
  readdirSync,
  readlinkSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import path from 'node:path'

/*
 * Who is using a thing (a database cluster, a scratch folder): one file per process, named by its number.
 * A process number alone proves nothing, since the system gives numbers out again; so the mark also holds
 * when the process began and which process namespace it was seen in.
 */

/** What tells this process from a later one with the same number; '' when there is no such process. */
function identityOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    const afterName = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    if (afterName[0] === 'Z') return '' // ended, only not yet collected by its parent
    return `${readlinkSync('/proc/self/ns/pid')} ${afterName[19]}`
  } catch {
    if (process.platform === 'linux') return ''
  }
  try {
    process.kill(pid, 0)
    return 'alive'
  } catch (error) {
    return error.code === 'EPERM' ? 'alive' : ''
  }
}

/** @param {string} folder @param {number} [pid] */
export function leaveMark(folder, pid = process.pid) {
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  writeFileSync(path.join(folder, String(pid)), identityOf(pid))
}

/** @param {string} folder @param {number} [pid] */
export function removeMark(folder, pid = process.pid) {
  rmSync(path.join(folder, String(pid)), { force: true })
}

/**
 * The processes that left a mark and still live. Marks of the dead are swept away; a mark made in another
 * process namespace (a container that shared the folder) cannot be judged from here: it stays and does not count.
 *
 * @param {string} folder
 * @returns {number[]}
 */
export function livingMarks(folder) {
  return marksIn(folder).flatMap(({ pid, mark, foreign }) => {
    if (foreign) return []
    if (mark && mark === identityOf(pid)) return [pid]
    removeMark(folder, pid)
    return []
  })
}

/** Whether a process of another namespace left a mark here. @param {string} folder */
export function hasForeignMarks(folder) {
  return marksIn(folder).some(({ foreign }) => foreign)
}

function marksIn(folder) {
  if (!existsSync(folder)) return []
  return readdirSync(folder).flatMap((name) => {
    try {
      const mark = readFileSync(path.join(folder, name), 'utf8')
      const foreign = mark.startsWith('pid:') && mark.split(' ')[0] !== readlinkSync('/proc/self/ns/pid')
      return [{ pid: Number(name), mark, foreign }]
    } catch {
      return [] // its process has just removed it
    }
  })
}
