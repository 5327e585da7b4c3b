import { z } from 'zod'
import { roles } from '../domain/permissions/roles.ts'

/** A record's id: UUIDv7, made by whoever records it, on the server or on a phone without a signal. */
export const RecordId = z.uuid({ version: 'v7' }).describe('UUIDv7 of the record')
/** An instant with its offset, for example 2026-12-01T14:20:00-05:00 */
export const Instant = z.iso.datetime({ offset: true }).describe('An instant, ISO 8601 with offset')
/** A calendar date at the facility. */
export const LocalDate = z.iso.date().describe('A calendar date at the facility, YYYY-MM-DD')
export const RoleName = z.enum(roles).describe('A role of the permission table')
export const Version = z.int().min(1).describe('The version that was read; a stale one is refused')
export const PersonName = z.string().trim().min(1).max(200).describe('Name as printed on records')
export const Email = z.email().max(254).toLowerCase().describe('E-mail address, the sign-in name')
export const Reason = z.string().trim().min(3).max(2000).describe('Why, in words')
/** What a person typed: the digits as entered, and the unit beside them. */
export const EnteredQuantity = z
  .strictObject({
    value: z.string().trim().min(1).max(40).describe('The digits as typed, for example 0.10'),
    unit: z.string().min(1).max(40).describe('Code of the unit, for example mg/L'),
  })
  .describe('A quantity as a person entered it')
export type EnteredQuantity = z.infer<typeof EnteredQuantity>

/** Paging, sorting and searching of a list, the same words everywhere. */
export const listQuery = <const S extends readonly [string, ...string[]]>(sorts: S) =>
  z.strictObject({
    q: z.string().trim().max(200).optional().describe('Words to look for'),
    sort: z.enum(sorts).optional().describe('Column to sort by'),
    direction: z.enum(['asc', 'desc']).optional().describe('Order of the sort'),
    cursor: z.string().max(500).optional().describe('Where the last page ended'),
    limit: z.coerce.number().int().min(1).max(200).optional().describe('Rows a page, 50 unless told'),
  })

/** One page of a list. */
export const page = <T extends z.ZodType>(row: T) =>
  z.object({
    rows: z.array(row).describe('The rows of this page'),
    nextCursor: z.string().nullable().describe('Where the next page begins; null on the last'),
    total: z.int().describe('How many rows there are in all'),
  })

/** What the reader may do with a record, decided by the server's own table: action names. */
export const May = z
  .array(z.string())
  .describe('Actions of the permission table that the reader may take here')
