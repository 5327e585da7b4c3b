import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * Orders are alike also when the volume of their water was determined anew between them, for another of its tanks: the
 * amount of the one still tells that of the other. Water is the same that shares a body.
 */
export class OrdersAlikeByWater1764600000043 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE OR REPLACE VIEW orders_alike AS
        SELECT v.order_id, w.order_id AS alike_id, v.signed_at
          FROM order_versions v JOIN order_versions w ON w.enclosure_id = v.enclosure_id AND w.agent = v.agent
         WHERE w.order_id <> v.order_id
        UNION ALL
        SELECT DISTINCT v.order_id, w.order_id, v.signed_at
          FROM order_versions v
          JOIN volume_determination_bodies b ON b.determination_id = v.determination_id
          JOIN volume_determination_bodies c ON c.water_body_id = b.water_body_id
          JOIN order_versions w ON w.determination_id = c.determination_id AND w.agent = v.agent
         WHERE w.order_id <> v.order_id AND w.enclosure_id <> v.enclosure_id`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
