import { Column } from 'typeorm'

/** Who recorded a fact, when it happened, on which day of the facility, and when it was written down. */
export abstract class RecordedFact {
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'date', name: 'happened_on' }) happenedOn!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
