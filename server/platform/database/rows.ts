import { In } from 'typeorm'
import type { EntityTarget, ObjectLiteral } from 'typeorm'
import { idAlreadyUsed } from './id-already-used.ts'
import { Problem } from '../http/problem.ts'
import type { Tx } from './transactions.ts'
import { noteChange } from './written-rows.ts'

/**
 * Changes a draft only if it still has the version that was read. TypeORM's own version column does not refuse a
 * stale save, so no versioned row is saved in any other way.
 */
export async function updateVersioned<T extends ObjectLiteral & { id: string; version: number }>(
  tx: Tx,
  target: EntityTarget<T>,
  key: { id: string; version: number },
  patch: Partial<T>,
): Promise<void> {
  await noteChange(tx.manager, tx.manager.connection.getMetadata(target).tableName, key.id)
  const done = await tx.manager
    .createQueryBuilder()
    .update(target)
    .set({ ...patch, version: () => 'version + 1' } as never)
    .where('id = :id AND version = :version', key)
    .execute()
  if (done.affected === 1) return
  const now = await tx.manager.findOneBy(target, { id: key.id } as never)
  if (!now) throw new Problem('not-found')
  throw new Problem('stale-version', {
    detail: 'What you wrote is kept. Read the newer version, then save again.',
    extra: { current_version: now.version },
  })
}

const comparable = (value: unknown) =>
  JSON.stringify(value instanceof Date ? value.toISOString() : (value ?? null))

const isSame = <T>(a: T, b: T, fields: readonly (keyof T)[]) =>
  fields.every((field) => comparable(a[field]) === comparable(b[field]))

/**
 * Whether a record under this id is there already with the same content: the same request sent again. With other
 * content the request is refused.
 */
export async function isRepeated<T extends ObjectLiteral & { id: string }>(
  tx: Tx,
  target: EntityTarget<T>,
  content: Partial<T> & { id: string },
): Promise<boolean> {
  const earlier = await tx.manager.findOneBy(target, { id: content.id } as never)
  if (!earlier) return false
  if (!isSame<Partial<T>>(earlier, content, Object.keys(content) as (keyof T)[])) throw idAlreadyUsed()
  return true
}

/**
 * Writes a record under its own id, once. The same id with the same content is the same request sent again and
 * changes nothing; with other content it is refused. Two at the same moment: the primary key stops the second, whose
 * transaction starts again and then finds the first.
 *
 * @param compare the fields that make the content; recording time and the like are left out
 * @returns whether the record is new
 */
export async function insertOnce<T extends ObjectLiteral & { id: string }>(
  tx: Tx,
  target: EntityTarget<T>,
  row: T,
  compare: readonly (keyof T)[],
): Promise<{ created: boolean }> {
  const content = Object.fromEntries(['id' as keyof T, ...compare].map((field) => [field, row[field]]))
  if (await isRepeated(tx, target, content as Partial<T> & { id: string })) return { created: false }
  await tx.manager.insert(target, row as never)
  return { created: true }
}

/**
 * Writes several records under their own ids, each once, in two statements however many they are.
 *
 * @returns the ids that are new
 */
export async function insertManyOnce<T extends ObjectLiteral & { id: string }>(
  tx: Tx,
  target: EntityTarget<T>,
  rows: readonly T[],
  compare: readonly (keyof T)[],
): Promise<Set<string>> {
  const stored: T[] = await tx.manager.findBy(target, { id: In(rows.map((row) => row.id)) } as never)
  const earlier = new Map(stored.map((row) => [row.id, row]))
  const fresh = rows.filter((row) => !earlier.has(row.id))
  for (const row of rows) {
    const before = earlier.get(row.id)
    if (before && !isSame(before, row, compare)) throw idAlreadyUsed()
  }
  if (fresh.length > 0) await tx.manager.insert(target, fresh as never)
  return new Set(fresh.map((row) => row.id))
}
