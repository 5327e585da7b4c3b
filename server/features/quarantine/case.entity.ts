import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { QuarantineKind } from '../../../shared/domain/quarantine/quarantine-kind.ts'
import type { CaseEventFacts } from './case-event-facts.ts'
import { RecordedFact } from './recorded-fact.entity.ts'

/** The head of a quarantine case: what it is called and which protocol it began under. Its state is computed. */
@Entity('quarantine_cases')
export class CaseRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) number!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text', name: 'quarantine_kind' }) quarantineKind!: QuarantineKind
  @Column({ type: 'uuid', name: 'protocol_version_id' }) protocolVersionId!: string
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** An animal or group of the batch; happened when it came in. Its id is that of the clock's arrival event. */
@Entity('case_members')
export class CaseMemberRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'case_id' }) caseId!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
}

/** Something that happened to a case, as the clock reads it; a ledger. */
@Entity('case_events')
export class CaseEventRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'case_id' }) caseId!: string
  @Column({ type: 'text' }) kind!: CaseEventFacts['kind']
  @Column({ type: 'jsonb' }) facts!: CaseEventFacts
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'text' }) origin!: 'online' | 'outbox'
  @Column({ type: 'text', nullable: true }) device!: string | null
  @Column({ type: 'uuid', name: 'observation_id', nullable: true }) observationId!: string | null
  @Column({ type: 'uuid', name: 'signed_text_id', nullable: true }) signedTextId!: string | null
}

/** That a step of the protocol was done, or tried in vain. */
@Entity('case_step_records')
export class CaseStepRecordRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'case_id' }) caseId!: string
  @Column({ type: 'text', name: 'step_key' }) stepKey!: string
  @Column({ type: 'text' }) outcome!: 'done' | 'failed'
  @Column({ type: 'text', nullable: true }) note!: string | null
}
