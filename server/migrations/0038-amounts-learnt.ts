import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Who knows which amounts, said once; and which orders tell each other's, being for one drug in one water. */
export class AmountsLearnt1764600000038 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    // a null key is every dose of the order; a first calculation counts against its own version by who made it
    await q.query(`
      CREATE VIEW amounts_learnt AS
        SELECT v.order_id, s.dose_key, s.person_id, s.recorded_at AS learnt_at, NULL::uuid AS first_of,
               false AS worked_out_blind
          FROM dose_amounts_seen s JOIN order_versions v ON v.id = s.order_version_id
        UNION ALL
        SELECT v.order_id, l.dose_key, l.recorded_by, l.recorded_at, v.id, false
          FROM dose_calculations l JOIN order_versions v ON v.id = l.order_version_id
         WHERE l.part = 'first'
        UNION ALL
        SELECT v.order_id, d.dose_key, d.recorded_by, d.recorded_at, NULL,
               EXISTS (SELECT 1 FROM dose_calculations c
                        WHERE c.id = d.second_calculation_id AND c.recorded_by = d.recorded_by AND c.agrees
                          AND NOT EXISTS (SELECT 1 FROM dose_calculations f
                                           WHERE f.order_version_id = c.order_version_id AND f.dose_key = c.dose_key
                                             AND f.part = 'first' AND f.recorded_by = c.recorded_by))
          FROM doses d JOIN order_versions v ON v.id = d.order_version_id
         WHERE d.amount_entered_value IS NOT NULL
        UNION ALL
        SELECT v.order_id, NULL, v.signed_by, v.signed_at, NULL, false FROM order_versions v
        UNION ALL
        SELECT o.id, NULL, o.created_by, o.created_at, NULL, false FROM orders o WHERE o.created_by IS NOT NULL
        UNION ALL
        SELECT v.order_id, NULL, p.person_id, p.recorded_at, NULL, false
          FROM amounts_previewed p JOIN order_versions v ON v.enclosure_id = p.enclosure_id AND v.agent = p.agent
         WHERE p.recorded_at BETWEEN v.signed_at - interval '30 days' AND v.signed_at`)
    await q.query('DROP VIEW order_previewers')
    // one water is one enclosure, or what one volume was determined for
    await q.query(`
      CREATE VIEW orders_alike AS
        SELECT v.order_id, w.order_id AS alike_id, v.signed_at
          FROM order_versions v JOIN order_versions w ON w.enclosure_id = v.enclosure_id AND w.agent = v.agent
         WHERE w.order_id <> v.order_id
        UNION ALL
        SELECT v.order_id, w.order_id, v.signed_at
          FROM order_versions v JOIN order_versions w ON w.determination_id = v.determination_id AND w.agent = v.agent
         WHERE w.order_id <> v.order_id AND w.enclosure_id <> v.enclosure_id`)
    await q.query('CREATE INDEX ix_order_versions_enclosure ON order_versions (enclosure_id, agent)')
    await q.query('CREATE INDEX ix_order_versions_determination ON order_versions (determination_id, agent)')
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
