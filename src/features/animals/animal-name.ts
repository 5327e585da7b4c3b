import type { AnimalRow } from '../../../shared/contracts/animals.contract.ts'

/** How an animal is spoken of in a sentence: its house name, else its common name and number. */
export function animalName(animal: Pick<AnimalRow, 'name' | 'accession' | 'taxon'>): string {
  return animal.name ?? `${animal.taxon.commonName} ${animal.accession}`
}

/** A count in words of figures: "85", "75 to 95". */
export function countText(count: AnimalRow['count']): string {
  const figure = (value: number) => value.toLocaleString('en-GB')
  return count.basis === 'estimated'
    ? `${figure(count.low)}\u2013${figure(count.high)}`
    : figure(count.ledger)
}
