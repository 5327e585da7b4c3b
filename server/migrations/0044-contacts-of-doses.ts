import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * How long each dose is in the water, as it was signed: the columns beside the signed text are copies, and may be changed
 * past the program. Not told where the text is gone or is not the one that was written.
 */
export class ContactsOfDoses1764600000044 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    // the text is read as JSON only after it was found to be as written
    await q.query(`
      CREATE VIEW contacts_of_doses AS
        SELECT d.id AS dose_id, coalesce(c.is_told, false) AS is_told, c.minutes AS contact_minutes
          FROM doses d
          LEFT JOIN order_versions v ON v.id = d.order_version_id
          LEFT JOIN signed_texts t ON t.id = v.signed_text_id AND t.subject_id = v.order_id
          LEFT JOIN LATERAL (
            SELECT row_is_as_written('signed_texts', t.id::text) AS is_told,
                   CASE WHEN row_is_as_written('signed_texts', t.id::text)
                             AND t.text::jsonb #>> '{content,fields,timing}' = 'timed'
                        THEN (t.text::jsonb #>> '{content,fields,contactMinutes}')::double precision END AS minutes
          ) c ON t.id IS NOT NULL`)
    await q.query(`REVOKE INSERT ON contacts_of_doses FROM pratique_app`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
