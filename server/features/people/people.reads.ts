import type { LicenceClass } from '../../../shared/domain/licences/licence-classes.ts'
import { containing } from '../../platform/database/like.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'

export interface PersonReadRow {
  id: string
  email: string
  printed_name: string
  active: boolean
  must_change_password: boolean
  preferences: Record<string, string>
  last_sign_in_at: Date | null
  created_at: Date
  version: number
  roles: Role[]
  licences: LicenceReadRow[]
  /** End of the last lock of signing, whether or not it is over. */
  signing_locked_until: Date | null
}

export interface LicenceReadRow {
  id: string
  class: LicenceClass
  jurisdiction: string
  number: string
  valid_from: string
  valid_until: string
  recorded_at: string
  recorded_by_name: string | null
  supersedes_id: string | null
  superseded: boolean
  reason: string | null
  end_id: string | null
  ended_on: string | null
  ended_reason: string | null
  ended_at: string | null
  ended_by_name: string | null
  void_id: string | null
  voided_reason: string | null
}

const columns = `
  p.id, p.email, p.printed_name, p.active, p.must_change_password, p.preferences, p.last_sign_in_at, p.created_at,
  p.version,
  coalesce((SELECT array_agg(r.role ORDER BY r.role) FROM person_roles r
             WHERE r.person_id = p.id AND r.withdrawn_at IS NULL), '{}') AS roles,
  coalesce((SELECT json_agg(json_build_object(
                     'id', l.id, 'class', coalesce(l.class, 'veterinary'), 'jurisdiction', l.jurisdiction,
                     'number', l.number, 'valid_from', l.valid_from,
                     'valid_until', l.valid_until, 'recorded_at', l.recorded_at,
                     'recorded_by_name', w.printed_name, 'supersedes_id', l.supersedes_id, 'reason', l.reason,
                     'superseded', EXISTS (SELECT 1 FROM licences n WHERE n.supersedes_id = l.id),
                     'end_id', e.id, 'ended_on', e.ended_on, 'ended_reason', e.reason, 'ended_at', e.recorded_at,
                     'ended_by_name', x.printed_name, 'void_id', v.id, 'voided_reason', v.reason)
                   ORDER BY l.valid_until DESC, l.recorded_at DESC)
              FROM licences l
              LEFT JOIN licence_voids v ON v.licence_id = l.id
              LEFT JOIN licence_ends e ON e.licence_id = l.id
              LEFT JOIN people w ON w.id = l.recorded_by
              LEFT JOIN people x ON x.id = e.recorded_by
             WHERE l.person_id = p.id), '[]') AS licences,
  (SELECT max(k.until_at) FROM signing_locks k WHERE k.person_id = p.id) AS signing_locked_until`

/** Whose a licence is; null when there is no such licence. */
export async function readLicenceHolder(db: Db, licenceId: string): Promise<string | null> {
  const [row]: { person_id: string }[] = await db.query(
    `SELECT l.person_id FROM licences l WHERE l.id = $1`,
    [licenceId],
  )
  return row?.person_id ?? null
}

export interface SigningLockReadRow {
  id: string
  person_id: string
  printed_name: string
  locked_at: Date
  until_at: Date
  wrong_tries: number
}

/** The locks of signing since an instant, the newest first. */
export function readSigningLocks(db: Db, since: Date): Promise<SigningLockReadRow[]> {
  return db.query(
    `SELECT k.id, k.person_id, p.printed_name, k.locked_at, k.until_at, k.wrong_tries
       FROM signing_locks k JOIN people p ON p.id = k.person_id
      WHERE k.locked_at > $1 ORDER BY k.locked_at DESC, k.id`,
    [since],
  )
}

export async function readPerson(db: Db, id: string): Promise<PersonReadRow | null> {
  const [row]: PersonReadRow[] = await db.query(`SELECT ${columns} FROM people p WHERE p.id = $1`, [id])
  return row ?? null
}

/** What sign-in needs of a person: the only read that gives out a password hash. */
export async function readCredentials(
  db: Db,
  email: string,
): Promise<{ id: string; password_hash: string; active: boolean } | null> {
  const [row]: { id: string; password_hash: string; active: boolean }[] = await db.query(
    `SELECT p.id, p.password_hash, p.active FROM people p WHERE lower(p.email) = lower($1)`,
    [email],
  )
  return row ?? null
}

export async function readPasswordHash(db: Db, id: string): Promise<string | null> {
  const [row]: { password_hash: string }[] = await db.query(
    `SELECT p.password_hash FROM people p WHERE p.id = $1`,
    [id],
  )
  return row?.password_hash ?? null
}

export async function countPeople(db: Db): Promise<number> {
  const [row]: { n: string }[] = await db.query(`SELECT count(*) AS n FROM people`)
  return Number(row?.n ?? 0)
}

export interface PeopleFilter {
  q?: string
  role?: Role
  active?: 'yes' | 'no'
  sort?: 'name' | 'email' | 'lastSignIn'
  direction?: 'asc' | 'desc'
  offset: number
  limit: number
}

const sortColumns = {
  name: 'lower(p.printed_name)',
  email: 'lower(p.email)',
  lastSignIn: 'p.last_sign_in_at',
} as const

export async function readPeople(
  db: Db,
  filter: PeopleFilter,
): Promise<{ rows: PersonReadRow[]; total: number }> {
  const where = `
    ($1::text IS NULL OR plain_text(p.printed_name) LIKE plain_text($1) OR plain_text(p.email) LIKE plain_text($1))
    AND ($2::text IS NULL OR EXISTS (SELECT 1 FROM person_roles r
          WHERE r.person_id = p.id AND r.role = $2 AND r.withdrawn_at IS NULL))
    AND ($3::boolean IS NULL OR p.active = $3)`
  const values = [
    containing(filter.q),
    filter.role ?? null,
    filter.active === undefined ? null : filter.active === 'yes',
  ]
  const order = `${sortColumns[filter.sort ?? 'name']} ${filter.direction === 'desc' ? 'DESC' : 'ASC'} NULLS LAST, p.id`
  const rows: PersonReadRow[] = await db.query(
    `SELECT ${columns} FROM people p WHERE ${where} ORDER BY ${order} LIMIT $4 OFFSET $5`,
    [...values, filter.limit, filter.offset],
  )
  const [count]: { n: string }[] = await db.query(`SELECT count(*) AS n FROM people p WHERE ${where}`, values)
  return { rows, total: Number(count?.n ?? 0) }
}
