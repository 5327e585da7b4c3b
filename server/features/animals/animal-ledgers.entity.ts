import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { CarcassPlace, CarcassState, DeathKind } from '../../../shared/domain/animals/description.ts'
import type { CountKind } from '../../../shared/domain/ledger/count-entry.ts'
import { RecordedFact } from './recorded-fact.entity.ts'

/** A line of the count ledger. */
@Entity('count_entries')
export class CountEntryRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'text' }) kind!: CountKind
  @Column({ type: 'integer' }) delta!: number
  @Column({ type: 'uuid', name: 'transfer_id', nullable: true }) transferId!: string | null
  @Column({ type: 'text', nullable: true }) reason!: string | null
}

/** What somebody counted or estimated; it changes no ledger by itself. */
@Entity('count_statements')
export class CountStatementRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'text' }) basis!: 'counted' | 'estimated'
  @Column({ type: 'integer' }) low!: number
  @Column({ type: 'integer' }) high!: number
  @Column({ type: 'text', nullable: true }) note!: string | null
}

/** A move of the whole animal or group; `null` is outside the house. */
@Entity('moves')
export class MoveRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'text' }) kind!: 'arrival' | 'move' | 'departure'
  @Column({ type: 'uuid', name: 'from_enclosure_id', nullable: true }) fromEnclosureId!: string | null
  @Column({ type: 'uuid', name: 'to_enclosure_id', nullable: true }) toEnclosureId!: string | null
  @Column({ type: 'text', nullable: true }) reason!: string | null
  /** Of a move across a quarantine boundary before clearance. */
  @Column({ type: 'text', name: 'documented_transfer', nullable: true }) documentedTransfer!: string | null
  /** The rule that it broke, for a move that had happened already. */
  @Column({ type: 'text', name: 'against_rule', nullable: true }) againstRule!: string | null
  /** Written by the count ledger when the last one left it, and struck out by it when there is one again. */
  @Column({ type: 'boolean' }) automatic!: boolean
}

/** The mass of one animal, or the mean of those weighed together. */
@Entity('weights')
export class WeightRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'numeric', name: 'entered_value' }) enteredValue!: string
  @Column({ type: 'text', name: 'entered_unit' }) enteredUnit!: string
  @Column({ type: 'integer', name: 'animals_weighed' }) animalsWeighed!: number
  @Column({ type: 'double precision', name: 'weight_kg' }) weightKg!: number
  @Column({ type: 'text' }) basis!: 'measured' | 'estimated'
  @Column({ type: 'text', nullable: true }) method!: string | null
  @Column({ type: 'text', nullable: true }) doubt!: string | null
  @Column({ type: 'text', name: 'confirmed_reason', nullable: true }) confirmedReason!: string | null
}

/** Deaths as whoever saw them recorded them, whether the ledger could give them or not. */
@Entity('deaths')
export class DeathRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'text' }) kind!: DeathKind
  @Column({ type: 'integer', name: 'seen_count' }) seenCount!: number
  @Column({ type: 'integer', name: 'posted_count' }) postedCount!: number
  @Column({ type: 'uuid', name: 'count_entry_id', nullable: true }) countEntryId!: string | null
  @Column({ type: 'uuid', name: 'enclosure_id', nullable: true }) enclosureId!: string | null
  @Column({ type: 'text', name: 'carcass_state', nullable: true }) carcassState!: CarcassState | null
  @Column({ type: 'text', name: 'carcass_place', nullable: true }) carcassPlace!: CarcassPlace | null
  @Column({ type: 'text', nullable: true }) note!: string | null
}

/** The striking out of a row above, with its reason. */
@Entity('animal_voids')
export class AnimalVoid {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'count_entry_id', nullable: true }) countEntryId!: string | null
  @Column({ type: 'uuid', name: 'move_id', nullable: true }) moveId!: string | null
  @Column({ type: 'uuid', name: 'weight_id', nullable: true }) weightId!: string | null
  @Column({ type: 'uuid', name: 'death_id', nullable: true }) deathId!: string | null
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
