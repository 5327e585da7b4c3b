import { DataSource } from 'typeorm'
import type { Db } from './db.ts'
import { isWithinTransaction } from './one-connection.ts'

type Reads = Record<string, () => Promise<unknown>>
type Answers<R extends Reads> = { [K in keyof R]: Awaited<ReturnType<R[K]>> }

/** Reads that do not need each other's answers: at once from the pool; within a transaction, which has one connection, in turn. */
export async function readTogether<R extends Reads>(db: Db, reads: R): Promise<Answers<R>> {
  const answers: Record<string, unknown> = {}
  const read = async ([name, ask]: [string, () => Promise<unknown>]) => {
    answers[name] = await ask()
  }
  const all = Object.entries(reads)
  if (db instanceof DataSource && !isWithinTransaction()) await Promise.all(all.map(read))
  else for (const one of all) await read(one)
  return answers as Answers<R>
}
