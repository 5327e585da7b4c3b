import type { MigrationInterface, QueryRunner } from 'typeorm'

/** What failed at one address is counted from the tries themselves; the counter of requests goes. */
export class SignInsOfAnAddress1764600000039 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`CREATE INDEX ix_sign_in_tries_address ON sign_in_tries (address, tried_at DESC)`)
    await q.query(`DROP TABLE rate_limits`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
