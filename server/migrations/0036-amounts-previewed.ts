import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Who worked out what a drug comes to in a water before an order for it was signed: they are no blind second person of it. */
export class AmountsPreviewed1764600000036 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE amounts_previewed (
        id uuid CONSTRAINT pk_amounts_previewed PRIMARY KEY,
        enclosure_id uuid NOT NULL CONSTRAINT fk_amounts_previewed_enclosure REFERENCES enclosures (id),
        agent text NOT NULL,
        person_id uuid NOT NULL CONSTRAINT fk_amounts_previewed_person REFERENCES people (id),
        previewed_on date NOT NULL,
        recorded_at timestamptz NOT NULL,
        CONSTRAINT uq_amounts_previewed_day UNIQUE (enclosure_id, agent, person_id, previewed_on)
      )`)
    // what came out a month before is not what comes out now
    await q.query(`
      CREATE VIEW order_previewers AS
        SELECT DISTINCT v.order_id, p.person_id
          FROM amounts_previewed p JOIN order_versions v ON v.enclosure_id = p.enclosure_id AND v.agent = p.agent
         WHERE p.recorded_at BETWEEN v.signed_at - interval '30 days' AND v.signed_at`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
