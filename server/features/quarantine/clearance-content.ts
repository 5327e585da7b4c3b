import type { Json } from '../../../shared/domain/canonical-json.ts'

/** What a signed clearance says about conditions, for the page; a text that is no longer readable says nothing. */
export function clearedContentOf(content: Json): { against: number; reason: string | null } {
  const said = content as { unmet?: unknown[]; reason?: string | null } | null
  return { against: said?.unmet?.length ?? 0, reason: said?.reason ?? null }
}
