import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { AnimalForm, BirthKind, LifeStage, Sex } from '../../../shared/domain/animals/description.ts'
import type { IdentifierKind } from '../../../shared/domain/animals/description.ts'
import { RecordedFact } from './recorded-fact.entity.ts'

/** An individual or a group under one accession number. Its description here is the newest one of its ledger. */
@Entity('animals')
export class Animal {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) accession!: string
  @Column({ type: 'text' }) form!: AnimalForm
  @Column({ type: 'uuid', name: 'split_from_id', nullable: true }) splitFromId!: string | null
  @Column({ type: 'uuid', name: 'taxon_id' }) taxonId!: string
  @Column({ type: 'text', nullable: true }) name!: string | null
  @Column({ type: 'text' }) sex!: Sex
  @Column({ type: 'text' }) stage!: LifeStage
  @Column({ type: 'text', name: 'birth_kind', nullable: true }) birthKind!: BirthKind | null
  @Column({ type: 'text', name: 'birth_date', nullable: true }) birthDate!: string | null
  @Column({ type: 'boolean', name: 'birth_approximate' }) birthApproximate!: boolean
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** Name, taxon, sex, stage and birth as known from an instant on; a ledger. */
@Entity('animal_descriptions')
export class AnimalDescription extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'uuid', name: 'taxon_id' }) taxonId!: string
  @Column({ type: 'text', nullable: true }) name!: string | null
  @Column({ type: 'text' }) sex!: Sex
  @Column({ type: 'text' }) stage!: LifeStage
  @Column({ type: 'text', name: 'birth_kind', nullable: true }) birthKind!: BirthKind | null
  @Column({ type: 'text', name: 'birth_date', nullable: true }) birthDate!: string | null
  @Column({ type: 'boolean', name: 'birth_approximate' }) birthApproximate!: boolean
  @Column({ type: 'text', nullable: true }) reason!: string | null
}

/** A tag, ring or transponder put on or read; a ledger. A new one never overwrites an old one. */
@Entity('identifiers')
export class Identifier extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'text' }) kind!: IdentifierKind
  @Column({ type: 'text' }) value!: string
  @Column({ type: 'text', name: 'value_key' }) valueKey!: string
  @Column({ type: 'text', nullable: true }) place!: string | null
  /** Why it was kept although another animal carries the same. */
  @Column({ type: 'text', name: 'twice_reason', nullable: true }) twiceReason!: string | null
}

/** The end of an identifier: lost, removed, read wrongly. */
@Entity('identifier_ends')
export class IdentifierEnd extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'identifier_id' }) identifierId!: string
  @Column({ type: 'text' }) reason!: string
}
