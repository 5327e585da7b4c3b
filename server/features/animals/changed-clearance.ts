/**
 * SQL that says whether a boundary was lifted by a clearance that is not what was signed any more: nobody can tell that
 * these animals were cleared, so the boundary stands.
 *
 * @param lock alias of a row of `movement_locks`
 */
export function liftedByChangedClearance(lock: string): string {
  return `(${lock}.kind = 'boundary' AND ${lock}.source_kind = 'quarantine-case' AND EXISTS (
    SELECT 1 FROM case_events e
     WHERE e.case_id = ${lock}.source_id AND e.kind = 'cleared'
       AND NOT (row_is_as_written('case_events', e.id::text)
                AND row_is_as_written('signed_texts', e.signed_text_id::text))))`
}
