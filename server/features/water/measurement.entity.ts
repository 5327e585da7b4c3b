import { Column, Entity } from 'typeorm'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import type { WaterEventKind } from '../../../shared/domain/places/water-event-kind.ts'
import { RecordedFact } from './water.entity.ts'

/** A measured value as its instrument gave it, and in the canonical unit. A ledger. */
@Entity('readings')
export class Reading extends RecordedFact {
  @Column({ type: 'uuid', name: 'water_body_id' }) waterBodyId!: string
  @Column({ type: 'text' }) parameter!: ReadingParameter
  @Column({ type: 'numeric', name: 'entered_value' }) enteredValue!: string
  @Column({ type: 'text', name: 'entered_unit' }) enteredUnit!: string
  @Column({ type: 'boolean' }) below!: boolean
  @Column({ type: 'text', nullable: true }) scale!: string | null
  @Column({ type: 'double precision', name: 'canonical_value' }) canonicalValue!: number
  @Column({ type: 'text', name: 'canonical_unit' }) canonicalUnit!: string
  @Column({ type: 'text', nullable: true }) instrument!: string | null
  @Column({ type: 'text', nullable: true }) note!: string | null
}

/** What is wanted of a parameter in an enclosure, from an instant on. A ledger: a newer one takes its place. */
@Entity('water_ranges')
export class WaterRangeRecord extends RecordedFact {
  @Column({ type: 'uuid', name: 'enclosure_id' }) enclosureId!: string
  @Column({ type: 'text' }) parameter!: ReadingParameter
  @Column({ type: 'text', name: 'entered_unit' }) enteredUnit!: string
  @Column({ type: 'numeric', name: 'outer_low_entered_value', nullable: true }) outerLowEntered!:
    string | null
  @Column({ type: 'numeric', name: 'inner_low_entered_value', nullable: true }) innerLowEntered!:
    string | null
  @Column({ type: 'numeric', name: 'inner_high_entered_value', nullable: true }) innerHighEntered!:
    string | null
  @Column({ type: 'numeric', name: 'outer_high_entered_value', nullable: true }) outerHighEntered!:
    string | null
  @Column({ type: 'text', name: 'canonical_unit' }) canonicalUnit!: string
  @Column({ type: 'double precision', name: 'outer_low', nullable: true }) outerLow!: number | null
  @Column({ type: 'double precision', name: 'inner_low', nullable: true }) innerLow!: number | null
  @Column({ type: 'double precision', name: 'inner_high', nullable: true }) innerHigh!: number | null
  @Column({ type: 'double precision', name: 'outer_high', nullable: true }) outerHigh!: number | null
  @Column({ type: 'boolean' }) withdrawn!: boolean
  @Column({ type: 'text', nullable: true }) reason!: string | null
}

/** A water change, backwash, media change or top-off. A ledger. */
@Entity('water_events')
export class WaterEvent extends RecordedFact {
  @Column({ type: 'uuid', name: 'water_body_id' }) waterBodyId!: string
  @Column({ type: 'text' }) kind!: WaterEventKind
  @Column({ type: 'numeric', name: 'amount_entered_value', nullable: true }) amountEnteredValue!:
    string | null
  @Column({ type: 'text', name: 'amount_entered_unit', nullable: true }) amountEnteredUnit!: string | null
  @Column({ type: 'double precision', name: 'amount_litres', nullable: true }) amountLitres!: number | null
  @Column({ type: 'numeric', name: 'share_entered_value', nullable: true }) shareEnteredValue!: string | null
  @Column({ type: 'double precision', name: 'share_percent', nullable: true }) sharePercent!: number | null
  @Column({ type: 'uuid', name: 'life_support_unit_id', nullable: true }) lifeSupportUnitId!: string | null
  @Column({ type: 'text', nullable: true }) note!: string | null
}
