import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { VolumeMethod } from '../../../shared/domain/connections/volume-determination.ts'
import { RecordedFact } from './water.entity.ts'

/** Part of a connected water shut off, by somebody, at a time. A ledger. */
@Entity('isolations')
export class IsolationRecord extends RecordedFact {
  @Column({ type: 'text', nullable: true }) note!: string | null
}

/** A body that an isolation parts from the rest. */
@Entity('isolation_bodies')
export class IsolationBody {
  @PrimaryColumn({ type: 'uuid', name: 'isolation_id' }) isolationId!: string
  @PrimaryColumn({ type: 'uuid', name: 'water_body_id' }) waterBodyId!: string
}

/** The test that isolated water is really parted. A ledger. */
@Entity('isolation_tests')
export class IsolationTest extends RecordedFact {
  @Column({ type: 'uuid', name: 'isolation_id' }) isolationId!: string
  @Column({ type: 'text' }) method!: string
  @Column({ type: 'boolean' }) passed!: boolean
}

/** The end of an isolation. A ledger. */
@Entity('isolation_ends')
export class IsolationEnd extends RecordedFact {
  @Column({ type: 'uuid', name: 'isolation_id' }) isolationId!: string
  @Column({ type: 'text', nullable: true }) note!: string | null
}

/** A net volume, sealed: with its inputs and working as they were, the bodies it covers and the valves it holds for. */
@Entity('volume_determinations')
export class VolumeDeterminationRecord extends RecordedFact {
  @Column({ type: 'text' }) method!: VolumeMethod
  @Column({ type: 'double precision', name: 'gross_volume_litres', nullable: true }) grossVolumeLitres!:
    number | null
  @Column({ type: 'double precision', name: 'net_volume_litres' }) netVolumeLitres!: number
  @Column({ type: 'double precision', name: 'error_percent', nullable: true }) errorPercent!: number | null
  @Column({ type: 'boolean', name: 'displacement_subtracted' }) displacementSubtracted!: boolean
  @Column({ type: 'text' }) inputs!: string
  @Column({ type: 'text' }) working!: string
  @Column({ type: 'uuid', name: 'isolation_id', nullable: true }) isolationId!: string | null
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ type: 'date', name: 'next_check_on', nullable: true }) nextCheckOn!: string | null
}

/** A body that a determination covers. */
@Entity('volume_determination_bodies')
export class VolumeDeterminationBody {
  @PrimaryColumn({ type: 'uuid', name: 'determination_id' }) determinationId!: string
  @PrimaryColumn({ type: 'uuid', name: 'water_body_id' }) waterBodyId!: string
}

/** The state of a valve or pump that a determination holds for. */
@Entity('volume_determination_valves')
export class VolumeDeterminationValve {
  @PrimaryColumn({ type: 'uuid', name: 'determination_id' }) determinationId!: string
  @PrimaryColumn({ type: 'uuid', name: 'connection_id' }) connectionId!: string
  @Column({ type: 'boolean' }) open!: boolean
}

/** A second person's confirmation. A ledger; the database refuses the determiner. */
@Entity('volume_confirmations')
export class VolumeConfirmation {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'determination_id' }) determinationId!: string
  @Column({ type: 'uuid', name: 'determined_by' }) determinedBy!: string
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ type: 'timestamptz', name: 'confirmed_at' }) confirmedAt!: Date
  @Column({ type: 'uuid', name: 'confirmed_by' }) confirmedBy!: string
}
