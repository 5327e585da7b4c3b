import { Column, Entity, PrimaryColumn } from 'typeorm'

/** Signing of a person locked after wrong passwords in a row, from one instant to another; a ledger. */
@Entity('signing_locks')
export class SigningLockRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'person_id' }) personId!: string
  @Column({ type: 'timestamptz', name: 'locked_at' }) lockedAt!: Date
  @Column({ type: 'timestamptz', name: 'until_at' }) untilAt!: Date
  @Column({ type: 'integer', name: 'wrong_tries' }) wrongTries!: number
  /** The last of the tries that it counted: they count towards no other lock. */
  @Column({ type: 'bigint', name: 'last_try_id' }) lastTryId!: string
}
