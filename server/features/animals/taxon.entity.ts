import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { LifeStage } from '../../../shared/domain/animals/description.ts'
import type { SourceMark } from '../../../shared/domain/sources.ts'
import type { SensitivityCode, SensitivityLevel } from '../../../shared/domain/taxa/sensitivity.ts'
import type { TaxonGroup } from '../../../shared/domain/taxa/taxon-group.ts'

/** A kind of animal, as the registrar names it. */
@Entity('taxa')
export class Taxon {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text', name: 'scientific_name' }) scientificName!: string
  @Column({ type: 'text', name: 'common_name' }) commonName!: string
  @Column({ type: 'text', name: 'taxon_group' }) taxonGroup!: TaxonGroup
  @Column({ type: 'text', name: 'quarantine_kind' }) quarantineKind!: string
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** What a healthy animal of a taxon may weigh; a ledger, the newest for a stage is in force. */
@Entity('taxon_weight_bands')
export class TaxonWeightBand {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'taxon_id' }) taxonId!: string
  @Column({ type: 'text', nullable: true }) stage!: LifeStage | null
  @Column({ type: 'numeric', name: 'low_entered_value' }) lowEnteredValue!: string
  @Column({ type: 'numeric', name: 'high_entered_value' }) highEnteredValue!: string
  @Column({ type: 'text', name: 'entered_unit' }) enteredUnit!: string
  @Column({ type: 'double precision', name: 'low_kg' }) lowKg!: number
  @Column({ type: 'double precision', name: 'high_kg' }) highKg!: number
  @Column({ type: 'text' }) source!: string
  @Column({ type: 'text' }) mark!: SourceMark
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** What a veterinarian says a taxon bears or does not; a ledger, the newest of a code is in force. */
@Entity('taxon_sensitivities')
export class TaxonSensitivity {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'taxon_id' }) taxonId!: string
  @Column({ type: 'text' }) code!: SensitivityCode
  @Column({ type: 'text' }) level!: SensitivityLevel
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
