import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { LicenceClass } from '../../../shared/domain/licences/licence-classes.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'

/** Somebody who signs in. Never deleted: an account is closed. */
@Entity('people')
export class Person {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) email!: string
  @Column({ type: 'text', name: 'printed_name' }) printedName!: string
  @Column({ type: 'text', name: 'password_hash' }) passwordHash!: string
  @Column({ type: 'boolean', name: 'must_change_password' }) mustChangePassword!: boolean
  @Column({ type: 'boolean' }) active!: boolean
  @Column({ type: 'jsonb', default: () => "'{}'" }) preferences!: Record<string, string>
  @Column({ type: 'timestamptz', name: 'last_sign_in_at', nullable: true }) lastSignInAt!: Date | null
  @Column({ type: 'timestamptz', name: 'created_at' }) createdAt!: Date
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** A role held from one instant to another. */
@Entity('person_roles')
export class PersonRole {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'person_id' }) personId!: string
  @Column({ type: 'text' }) role!: Role
  @Column({ type: 'timestamptz', name: 'granted_at' }) grantedAt!: Date
  @Column({ type: 'uuid', name: 'granted_by', nullable: true }) grantedBy!: string | null
  @Column({ type: 'timestamptz', name: 'withdrawn_at', nullable: true }) withdrawnAt!: Date | null
  @Column({ type: 'uuid', name: 'withdrawn_by', nullable: true }) withdrawnBy!: string | null
}

/** A licence as it was entered; a ledger. A wrong one is voided, or corrected by another entry that supersedes it. */
@Entity('licences')
export class LicenceRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'person_id' }) personId!: string
  /** Empty in the oldest rows, which are licences to practise. */
  @Column({ type: 'text', nullable: true }) class!: LicenceClass | null
  @Column({ type: 'text' }) jurisdiction!: string
  @Column({ type: 'text' }) number!: string
  @Column({ type: 'date', name: 'valid_from' }) validFrom!: string
  @Column({ type: 'date', name: 'valid_until' }) validUntil!: string
  /** The entry in whose place this one stands, and why. */
  @Column({ type: 'uuid', name: 'supersedes_id', nullable: true }) supersedesId!: string | null
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** The end of a licence before its time, with its last day and the reason; a ledger. */
@Entity('licence_ends')
export class LicenceEnd {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'licence_id' }) licenceId!: string
  @Column({ type: 'date', name: 'ended_on' }) endedOn!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** The voiding of a licence, with its reason; a ledger. */
@Entity('licence_voids')
export class LicenceVoid {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'licence_id' }) licenceId!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
