import { quarantineKindOf } from '../taxa/taxon-group.ts'
import type { AnimalInWater } from './caution-facts.ts'
import type { NamedAnimal } from './caution-param.ts'

export function isInvertebrate(animal: AnimalInWater): boolean {
  return quarantineKindOf(animal.taxonGroup) === 'invertebrate'
}

/** Finfish in the sense of labels: bony and cartilaginous fish. */
export function isFinfish(animal: AnimalInWater): boolean {
  return quarantineKindOf(animal.taxonGroup) === 'fish'
}

export function isEgg(animal: AnimalInWater): boolean {
  return animal.lifeStage === 'egg'
}

/** How a caution names animals. */
export function namesOf(animals: readonly AnimalInWater[]): NamedAnimal[] {
  return animals.map(({ label, commonName, enclosureCode }) => ({ label, commonName, enclosureCode }))
}

/** Whether the animal is of a species, by its scientific name without regard to case or subspecies. */
export function isSpecies(animal: AnimalInWater, scientificName: string): boolean {
  const name = animal.scientificName.trim().toLowerCase()
  const wanted = scientificName.toLowerCase()
  return name === wanted || name.startsWith(`${wanted} `)
}
