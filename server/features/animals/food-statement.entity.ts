import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { FoodAnswer } from '../../../shared/domain/animals/food-or-release.ts'
import { RecordedFact } from './recorded-fact.entity.ts'

/** What somebody said of an animal: whether it may be eaten or set free; a ledger. */
@Entity('food_statements')
export class FoodStatementRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'text' }) answer!: FoodAnswer
  @Column({ type: 'text' }) reason!: string
}
