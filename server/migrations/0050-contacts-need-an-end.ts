import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * The mark of the signed text is asked for once a dose, and the view says of which baths an end has to be recorded: those
 * with minutes, and those whose minutes cannot be told.
 */
export class ContactsNeedAnEnd1764600000050 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    // OFFSET 0 keeps the mark from being asked for again by each column that needs it
    await q.query(`
      CREATE OR REPLACE VIEW contacts_of_doses AS
        SELECT d.id AS dose_id, coalesce(c.is_told, false) AS is_told, c.minutes AS contact_minutes,
               c.minutes IS NOT NULL OR NOT coalesce(c.is_told, false) AS needs_an_end
          FROM doses d
          LEFT JOIN order_versions v ON v.id = d.order_version_id
          LEFT JOIN signed_texts t ON t.id = v.signed_text_id AND t.subject_id = v.order_id
          LEFT JOIN LATERAL (
            SELECT m.is_told,
                   CASE WHEN m.is_told AND t.text::jsonb #>> '{content,fields,timing}' = 'timed'
                        THEN (t.text::jsonb #>> '{content,fields,contactMinutes}')::double precision END AS minutes
              FROM (SELECT row_is_as_written('signed_texts', t.id::text) AS is_told OFFSET 0) m
             OFFSET 0
          ) c ON t.id IS NOT NULL`)
    await q.query(`REVOKE INSERT ON contacts_of_doses FROM pratique_app`)
    // Dear enough that whatever else leaves a row out is looked at before its mark
    await q.query(`ALTER FUNCTION row_is_as_written(regclass, text) COST 10000`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
