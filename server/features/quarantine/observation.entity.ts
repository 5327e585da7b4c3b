import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { Breathing, CountBasis, Feeding, Skin } from '../../../shared/domain/observations/observation.ts'
import { RecordedFact } from './recorded-fact.entity.ts'

/** What somebody saw at an enclosure; a ledger. Null everywhere means that nothing was said, which is not "none". */
@Entity('observations')
export class ObservationRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'enclosure_id' }) enclosureId!: string
  @Column({ type: 'integer', name: 'schema_version' }) schemaVersion!: number
  @Column({ type: 'text' }) origin!: 'online' | 'outbox'
  @Column({ type: 'text' }) device!: string
  /** When it was made, by the clock of the device. */
  @Column({ type: 'timestamptz', name: 'said_at' }) saidAt!: Date
  /** The device's clock was ahead; `happenedAt` is then the time of receipt. */
  @Column({ type: 'boolean', name: 'time_doubtful' }) timeDoubtful!: boolean
  @Column({ type: 'boolean', name: 'looked_at' }) lookedAt!: boolean
  @Column({ type: 'text', nullable: true }) feeding!: Feeding | null
  @Column({ type: 'text', nullable: true }) breathing!: Breathing | null
  @Column({ type: 'text', nullable: true }) skin!: Skin | null
  @Column({ type: 'text', array: true }) signs!: string[]
  @Column({ type: 'text', nullable: true }) words!: string | null
  @Column({ type: 'text', name: 'count_basis', nullable: true }) countBasis!: CountBasis | null
  @Column({ type: 'integer', name: 'count_low', nullable: true }) countLow!: number | null
  @Column({ type: 'integer', name: 'count_high', nullable: true }) countHigh!: number | null
  @Column({ type: 'integer', name: 'found_dead', nullable: true }) foundDead!: number | null
  /** Of these, bodies of which nobody could say whose they are. */
  @Column({ type: 'integer', name: 'unassigned_dead' }) unassignedDead!: number
  /** Moribund or not eating. */
  @Column({ type: 'integer', name: 'unwell_count', nullable: true }) unwell!: number | null
  /** Netted, moved, examined or sampled within the last day. */
  @Column({ type: 'boolean', nullable: true }) handled!: boolean | null
  @Column({ type: 'boolean', name: 'for_veterinarian' }) forVeterinarian!: boolean
  @Column({ type: 'boolean' }) urgent!: boolean
}

/** The cases whose batch was in the enclosure. */
@Entity('observation_cases')
export class ObservationCaseRow {
  @PrimaryColumn({ type: 'uuid', name: 'observation_id' }) observationId!: string
  @PrimaryColumn({ type: 'uuid', name: 'case_id' }) caseId!: string
}

/** Deaths that were recorded with an observation. */
@Entity('observation_deaths')
export class ObservationDeathRow {
  @PrimaryColumn({ type: 'uuid', name: 'observation_id' }) observationId!: string
  @PrimaryColumn({ type: 'uuid', name: 'death_id' }) deathId!: string
}

@Entity('observation_voids')
export class ObservationVoidRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'observation_id' }) observationId!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** A veterinarian has read what was marked for them. */
@Entity('observation_reviews')
export class ObservationReviewRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'observation_id' }) observationId!: string
  @Column({ type: 'text', nullable: true }) words!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** Whose the bodies were that the observation could not name, found out later; or why nobody will know. */
@Entity('observation_bodies')
export class ObservationBodiesRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'observation_id' }) observationId!: string
  /** Of the bodies without a name, those named now. */
  @Column({ type: 'integer', name: 'named_count' }) namedCount!: number
  /** The how manieth naming of this look; null, the first, in older records. */
  @Column({ type: 'integer', name: 'naming_no', nullable: true }) namingNo!: number | null
  /** Bodies that waited for a name then, named or explained; null, all without a name, in older records. */
  @Column({ type: 'integer', name: 'settled_count', nullable: true }) settledCount!: number | null
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
