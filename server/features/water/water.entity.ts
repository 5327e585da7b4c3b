import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { ConnectionKind } from '../../../shared/domain/connections/water-map.ts'
import type { LifeSupportKind } from '../../../shared/domain/places/life-support-kind.ts'

/** What every ledger of the water says: when it happened, on which facility date, and who wrote it down when. */
export abstract class RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'date', name: 'happened_on' }) happenedOn!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** A valve or a pump between two bodies. */
@Entity('connections')
export class ConnectionRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text' }) kind!: ConnectionKind
  @Column({ type: 'uuid', name: 'from_body_id' }) fromBodyId!: string
  @Column({ type: 'uuid', name: 'to_body_id' }) toBodyId!: string
  @Column({ type: 'timestamptz', name: 'in_use_from' }) inUseFrom!: Date
  @Column({ type: 'timestamptz', name: 'in_use_until', nullable: true }) inUseUntil!: Date | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** Opened or shut; started or stopped. A ledger. */
@Entity('connection_states')
export class ConnectionStateRecord extends RecordedFact {
  @Column({ type: 'uuid', name: 'connection_id' }) connectionId!: string
  @Column({ type: 'boolean' }) open!: boolean
  @Column({ type: 'text', nullable: true }) note!: string | null
}

/** A filter, heater, pump and so on, on one body of water. */
@Entity('life_support_units')
export class LifeSupportUnit {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text' }) kind!: LifeSupportKind
  @Column({ type: 'uuid', name: 'water_body_id' }) waterBodyId!: string
  @Column({ type: 'timestamptz', name: 'in_use_from' }) inUseFrom!: Date
  @Column({ type: 'timestamptz', name: 'in_use_until', nullable: true }) inUseUntil!: Date | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** Switched on or off. A ledger. */
@Entity('life_support_states')
export class LifeSupportState extends RecordedFact {
  @Column({ type: 'uuid', name: 'unit_id' }) unitId!: string
  @Column({ type: 'boolean', name: 'is_on' }) isOn!: boolean
  @Column({ type: 'text', nullable: true }) note!: string | null
}

/** The correction of a fact: the wrong row stays readable and no longer counts. Exactly one column names it. */
@Entity('water_voids')
export class WaterVoid {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'reading_id', nullable: true }) readingId!: string | null
  @Column({ type: 'uuid', name: 'water_event_id', nullable: true }) waterEventId!: string | null
  @Column({ type: 'uuid', name: 'connection_state_id', nullable: true }) connectionStateId!: string | null
  @Column({ type: 'uuid', name: 'life_support_state_id', nullable: true }) lifeSupportStateId!: string | null
  @Column({ type: 'uuid', name: 'determination_id', nullable: true }) determinationId!: string | null
  @Column({ type: 'uuid', name: 'isolation_id', nullable: true }) isolationId!: string | null
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
