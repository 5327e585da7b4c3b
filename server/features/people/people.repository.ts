import type { Role } from '../../../shared/domain/permissions/roles.ts'
import { insertOnce, updateVersioned } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { noteChange } from '../../platform/database/written-rows.ts'
import { LicenceEnd, LicenceRecord, LicenceVoid, Person, PersonRole } from './person.entity.ts'

export function insertPerson(tx: Tx, row: Person): Promise<{ created: boolean }> {
  return insertOnce(tx, Person, row, ['email', 'printedName'])
}

/** The person's row, locked until the transaction ends; null when there is none. */
export function lockPerson(tx: Tx, id: string): Promise<Person | null> {
  return tx.manager.findOne(Person, { where: { id }, lock: { mode: 'pessimistic_write' } })
}

export function savePerson(
  tx: Tx,
  key: { id: string; version: number },
  patch: Partial<Pick<Person, 'email' | 'printedName' | 'active'>>,
): Promise<void> {
  return updateVersioned(tx, Person, key, patch)
}

export async function setPassword(
  tx: Tx,
  id: string,
  passwordHash: string,
  mustChange: boolean,
): Promise<void> {
  await tx.manager.update(Person, { id }, { passwordHash, mustChangePassword: mustChange })
}

export async function setPreferences(tx: Tx, id: string, preferences: Record<string, string>): Promise<void> {
  await tx.manager.update(Person, { id }, { preferences })
}

export async function noteSignIn(tx: Tx, id: string): Promise<void> {
  await tx.manager.update(Person, { id }, { lastSignInAt: tx.at })
}

export async function rolesHeld(tx: Tx, personId: string): Promise<Role[]> {
  const rows: { role: Role }[] = await tx.manager.query(
    `SELECT r.role FROM person_roles r WHERE r.person_id = $1 AND r.withdrawn_at IS NULL ORDER BY r.role`,
    [personId],
  )
  return rows.map((row) => row.role)
}

export async function grantRole(tx: Tx, row: PersonRole): Promise<void> {
  await tx.manager.insert(PersonRole, row)
}

export async function withdrawRole(tx: Tx, personId: string, role: Role): Promise<void> {
  const [held]: { id: string }[] = await tx.manager.query(
    `SELECT r.id FROM person_roles r WHERE r.person_id = $1 AND r.role = $2 AND r.withdrawn_at IS NULL FOR UPDATE`,
    [personId, role],
  )
  if (!held) return
  await noteChange(tx.manager, 'person_roles', held.id)
  await tx.manager.query(`UPDATE person_roles SET withdrawn_at = $2, withdrawn_by = $3 WHERE id = $1`, [
    held.id,
    tx.at,
    tx.actor.personId,
  ])
}

/** How many other people can still administer; their rows are locked, so that two cannot remove each other. */
export async function countOtherAdministrators(tx: Tx, personId: string): Promise<number> {
  const rows: unknown[] = await tx.manager.query(
    `SELECT p.id FROM people p
      WHERE p.active AND p.id <> $1 AND EXISTS (
        SELECT 1 FROM person_roles r
         WHERE r.person_id = p.id AND r.role = 'administrator' AND r.withdrawn_at IS NULL)
      ORDER BY p.id FOR UPDATE`,
    [personId],
  )
  return rows.length
}

export function insertLicence(tx: Tx, row: LicenceRecord): Promise<{ created: boolean }> {
  return insertOnce(tx, LicenceRecord, row, [
    'personId',
    'class',
    'jurisdiction',
    'number',
    'validFrom',
    'validUntil',
    'supersedesId',
    'reason',
  ])
}

export async function isSuperseded(tx: Tx, licenceId: string): Promise<boolean> {
  return tx.manager.existsBy(LicenceRecord, { supersedesId: licenceId })
}

export async function isEnded(tx: Tx, licenceId: string): Promise<boolean> {
  return tx.manager.existsBy(LicenceEnd, { licenceId })
}

export async function insertLicenceEnd(tx: Tx, row: LicenceEnd): Promise<void> {
  await tx.manager.insert(LicenceEnd, row)
}

export function findLicence(tx: Tx, id: string): Promise<LicenceRecord | null> {
  return tx.manager.findOneBy(LicenceRecord, { id })
}

export async function isVoid(tx: Tx, licenceId: string): Promise<boolean> {
  return tx.manager.existsBy(LicenceVoid, { licenceId })
}

export async function insertLicenceVoid(tx: Tx, row: LicenceVoid): Promise<void> {
  await tx.manager.insert(LicenceVoid, row)
}

/** Ends every session of a person, on whatever device, but the one named. */
export async function endSessions(tx: Tx, personId: string, kept: string | null = null): Promise<void> {
  await tx.manager.query(
    `DELETE FROM session WHERE sess -> 'passport' ->> 'user' = $1 AND sid IS DISTINCT FROM $2`,
    [personId, kept],
  )
}
