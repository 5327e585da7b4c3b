import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { WaterBodyKind } from '../../../shared/domain/connections/water-map.ts'
import type { EnclosureKind } from '../../../shared/domain/places/enclosure-kind.ts'

/** A place where animals are held or treated. Its code never changes; it is taken out of use, never deleted. */
@Entity('enclosures')
export class Enclosure {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text' }) kind!: EnclosureKind
  @Column({ type: 'text' }) area!: string
  @Column({ type: 'text', nullable: true }) boundary!: string | null
  @Column({ type: 'text', name: 'air_space', nullable: true }) airSpace!: string | null
  @Column({ type: 'boolean', name: 'treatment_vessel' }) treatmentVessel!: boolean
  @Column({ type: 'text', name: 'fill_mark', nullable: true }) fillMark!: string | null
  @Column({ type: 'numeric', name: 'fill_mark_entered_value', nullable: true }) fillMarkEnteredValue!:
    string | null
  @Column({ type: 'text', name: 'fill_mark_entered_unit', nullable: true }) fillMarkEnteredUnit!:
    string | null
  @Column({ type: 'double precision', name: 'fill_mark_litres', nullable: true }) fillMarkLitres!:
    number | null
  @Column({ type: 'text', nullable: true }) description!: string | null
  @Column({ type: 'timestamptz', name: 'in_use_from' }) inUseFrom!: Date
  @Column({ type: 'timestamptz', name: 'in_use_until', nullable: true }) inUseUntil!: Date | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** The water of one enclosure, sump or loop. */
@Entity('water_bodies')
export class WaterBodyRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text' }) kind!: WaterBodyKind
  @Column({ type: 'uuid', name: 'enclosure_id', nullable: true }) enclosureId!: string | null
  @Column({ type: 'timestamptz', name: 'in_use_from' }) inUseFrom!: Date
  @Column({ type: 'timestamptz', name: 'in_use_until', nullable: true }) inUseUntil!: Date | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}
