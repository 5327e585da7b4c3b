import type { MigrationInterface, QueryRunner } from 'typeorm'

/** A lot that somebody looked at and found clear: what formalin asks for before the dose. */
export class LotLooks1764600000019 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`ALTER TABLE lot_events DROP CONSTRAINT ck_lot_events_kind`)
    await q.query(`
      ALTER TABLE lot_events ADD CONSTRAINT ck_lot_events_kind
        CHECK (kind IN ('recalled', 'set-aside', 'stored-cold', 'precipitate', 'returned-to-use', 'used-up', 'looked-at'))`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
