import { Column, Entity, PrimaryColumn } from 'typeorm'

/** A first or second working of one dose's amount; a ledger. */
@Entity('dose_calculations')
export class DoseCalculation {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'order_version_id' }) orderVersionId!: string
  @Column({ type: 'text', name: 'dose_key' }) doseKey!: string
  @Column({ type: 'text' }) part!: 'first' | 'second'
  @Column({ type: 'text', name: 'enclosure_read', nullable: true }) enclosureRead!: string | null
  @Column({ type: 'text', name: 'mark_read', nullable: true }) markRead!: string | null
  @Column({ type: 'text', name: 'lot_read', nullable: true }) lotRead!: string | null
  @Column({ type: 'uuid', name: 'lot_id', nullable: true }) lotId!: string | null
  @Column({ type: 'numeric', name: 'strength_entered_value', nullable: true }) strengthEnteredValue!:
    string | null
  @Column({ type: 'text', name: 'strength_entered_unit', nullable: true }) strengthEnteredUnit!: string | null
  @Column({ type: 'numeric', name: 'amount_entered_value' }) amountEnteredValue!: string
  @Column({ type: 'text', name: 'amount_entered_unit' }) amountEnteredUnit!: string
  @Column({ type: 'double precision', name: 'net_volume_litres', nullable: true }) netVolumeLitres!:
    number | null
  @Column({ type: 'boolean', nullable: true }) agrees!: boolean | null
  @Column({ type: 'double precision', name: 'difference_percent', nullable: true }) differencePercent!:
    number | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}

/** A dose that was given, recorded, withheld or refused; a ledger. Two records of one planned dose are both kept. */
@Entity('doses')
export class DoseRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  /** Null in records from before a dose said its order itself. */
  @Column({ type: 'uuid', name: 'order_id', nullable: true }) orderId!: string | null
  /** Null where every signed version of the order was gone when it was recorded. */
  @Column({ type: 'uuid', name: 'order_version_id', nullable: true }) orderVersionId!: string | null
  @Column({ type: 'text', name: 'dose_key' }) doseKey!: string
  @Column({ type: 'text' }) kind!: 'given' | 'recorded' | 'withheld' | 'refused'
  @Column({ type: 'uuid', name: 'lot_id', nullable: true }) lotId!: string | null
  @Column({ type: 'numeric', name: 'amount_entered_value', nullable: true }) amountEnteredValue!:
    string | null
  @Column({ type: 'text', name: 'amount_entered_unit', nullable: true }) amountEnteredUnit!: string | null
  @Column({ type: 'double precision', name: 'given_mg_per_l', nullable: true }) givenMgPerL!: number | null
  @Column({ type: 'uuid', name: 'second_calculation_id', nullable: true }) secondCalculationId!: string | null
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ type: 'text', name: 'facts_text', nullable: true }) factsText!: string | null
  @Column({ type: 'text', name: 'exceptions_text' }) exceptionsText!: string
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'date', name: 'happened_on' }) happenedOn!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}

/** A record of a dose or of its end that was struck out with a reason; a ledger. */
@Entity('dose_voids')
export class DoseVoidRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'dose_id', nullable: true }) doseId!: string | null
  @Column({ type: 'uuid', name: 'stop_id', nullable: true }) stopId!: string | null
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}

/** The end of a bath, at its time or before; a ledger. */
@Entity('bath_stops')
export class BathStopRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'dose_id' }) doseId!: string
  @Column({ type: 'text' }) cause!: 'time-up' | 'stopped'
  @Column({ type: 'text', nullable: true }) seen!: string | null
  @Column({ type: 'text', nullable: true }) rescue!: string | null
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'date', name: 'happened_on' }) happenedOn!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}
