import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { DiscrepancyKind, DiscrepancyOutcome } from '../../../shared/domain/animals/discrepancy.ts'
import { RecordedFact } from './recorded-fact.entity.ts'

/** What a discrepancy names as its source where a recorded dose left it. */
export const doseSource = 'dose'

/** A recorded fact that does not fit what stood in the ledgers, for a named role to explain. */
@Entity('discrepancies')
export class DiscrepancyRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'text' }) kind!: DiscrepancyKind
  @Column({ type: 'text', name: 'for_role' }) forRole!: 'veterinarian' | 'registrar'
  @Column({ type: 'text', name: 'source_kind' }) sourceKind!: string
  @Column({ type: 'uuid', name: 'source_id' }) sourceId!: string
  @Column({ type: 'jsonb' }) facts!: Record<string, string | number>
}

@Entity('discrepancy_resolutions')
export class DiscrepancyResolutionRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'discrepancy_id' }) discrepancyId!: string
  @Column({ type: 'text' }) outcome!: DiscrepancyOutcome
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** A lock that quarantine puts on the movement of an animal, and its lift; ledgers. */
@Entity('movement_locks')
export class MovementLockRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'text' }) kind!: 'boundary' | 'all'
  @Column({ type: 'text', name: 'source_kind' }) sourceKind!: string
  @Column({ type: 'uuid', name: 'source_id' }) sourceId!: string
  @Column({ type: 'text', name: 'source_label' }) sourceLabel!: string
  @Column({ type: 'text' }) reason!: string
}

@Entity('movement_lock_lifts')
export class MovementLockLiftRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'lock_id' }) lockId!: string
  @Column({ type: 'text' }) reason!: string
}
