import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * A dose belongs to its order, whatever becomes of the signed version: what went in is recorded where somebody took every
 * version away, and a bath that was begun before that can still be ended.
 */
export class DosesOfGoneOrders1764600000041 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    // empty in older rows, which find their order by their version: a column that was filled would change their marks
    await q.query(
      `ALTER TABLE doses ADD COLUMN order_id uuid CONSTRAINT fk_doses_order REFERENCES orders (id)`,
    )
    await q.query(`ALTER TABLE doses ALTER COLUMN order_version_id DROP NOT NULL`)
    await q.query(`
      ALTER TABLE doses ADD CONSTRAINT ck_doses_order CHECK (num_nonnulls(order_version_id, order_id) > 0)`)
    await q.query(`CREATE INDEX ix_doses_order ON doses (order_id)`)
    await q.query(`
      CREATE OR REPLACE VIEW live_doses AS
        SELECT d.* FROM doses d WHERE NOT EXISTS (SELECT 1 FROM dose_voids v WHERE v.dose_id = d.id)`)
    await q.query(`
      CREATE VIEW orders_of_doses AS
        SELECT d.id AS dose_id, d.order_id FROM doses d WHERE d.order_id IS NOT NULL
         UNION ALL
        SELECT d.id, v.order_id FROM doses d JOIN order_versions v ON v.id = d.order_version_id
         WHERE d.order_id IS NULL`)
    await q.query(`REVOKE INSERT ON orders_of_doses FROM pratique_app`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
