import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { CounterpartyKind } from '../../../shared/domain/register/counterparty-kinds.ts'

/** Another party that animals come from or go to. A draft: it is corrected, and the audit trail keeps what it was. */
@Entity('counterparties')
export class CounterpartyRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text' }) kind!: CounterpartyKind
  @Column({ type: 'text', nullable: true }) address!: string | null
  @Column({ type: 'text', nullable: true }) registration!: string | null
  @Column({ type: 'text', nullable: true }) email!: string | null
  @Column({ type: 'text', nullable: true }) telephone!: string | null
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}
