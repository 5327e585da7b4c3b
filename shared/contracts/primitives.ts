import { z } from 'zod'
import { isPartialDate } from '../domain/register/partial-date.ts'
import {
  firstPlausibleYear,
  firstYearOfOrigin,
  isInPlausibleYear,
  isPlausibleInstant,
  lastPlausibleYear,
} from '../domain/time/plausible-time.ts'
import { roles } from '../domain/permissions/roles.ts'
import './input-words.ts'

function outsideYears(first: number): string {
  return `Check the year: it has to lie between ${String(first)} and ${String(lastPlausibleYear)}`
}

/** A record's id: UUIDv7, made by whoever records it, on the server or on a phone without a signal. */
export const RecordId = z.uuid({ version: 'v7' }).describe('UUIDv7 of the record')
/** An instant with its offset, for example 2026-12-01T14:20:00-05:00 */
export const Instant = z.iso
  .datetime({
    offset: true,
    abort: true,
    error: 'Give a day and a time with its offset, for example 2026-12-01T14:20:00-05:00',
  })
  .refine(isPlausibleInstant, outsideYears(firstPlausibleYear))
  .describe('An instant, ISO 8601 with offset')
/** A calendar date at the facility. */
export const LocalDate = z.iso
  .date({ abort: true, error: 'Give a day that the calendar has, for example 2026-12-01' })
  .refine((text) => isInPlausibleYear(text), outsideYears(firstPlausibleYear))
  .describe('A calendar date at the facility, YYYY-MM-DD')
/** A date as exactly as it is known: how it is written says how exact it is. */
export const PartialDate = z
  .string()
  .trim()
  .refine(isPartialDate, {
    error: 'Give a year, a month or a day that the calendar has: 2026, 2026-03 or 2026-03-14',
    abort: true,
  })
  .refine((text) => isInPlausibleYear(text, firstYearOfOrigin), outsideYears(firstYearOfOrigin))
  .describe('Date as exactly as it is known: YYYY, YYYY-MM or YYYY-MM-DD')
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

/**
 * A list in which nothing stands twice. Two entries are the same by their own value, by their `id`, or by further fields
 * together, so that no table has to say it in the words of a database.
 *
 * @param together names of fields that together may stand once, for example `['permitId', 'lineId']`
 */
export function noneTwice<T extends z.ZodArray>(list: T, ...together: (readonly string[])[]): T {
  const isRecord = (row: unknown): row is Record<string, unknown> => typeof row === 'object' && row !== null
  return list
    .superRefine((rows: unknown[], context) => {
      for (const fields of [['id'], ...together]) {
        const seen = new Set<string>()
        rows.forEach((row, index) => {
          const key = JSON.stringify(isRecord(row) ? fields.map((field) => row[field]) : row)
          if (seen.has(key))
            context.addIssue({
              code: 'custom',
              message: 'This stands in the list twice. Leave one out.',
              path: isRecord(row) && fields.length === 1 ? [index, ...fields] : [index],
            })
          seen.add(key)
        })
      }
    })
    .meta({ uniqueItems: true }) as T
}

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
