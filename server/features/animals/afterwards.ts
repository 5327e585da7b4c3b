import type { Tx } from '../../platform/database/transactions.ts'

/** What follows from a change of the ledgers, in its transaction. The features that rest on animals say it here. */
export interface Follower {
  /** A death was struck out. */
  deathStruck(tx: Tx, deathId: string): Promise<void>
  /** Where an animal was is known otherwise than before. */
  placesChanged(tx: Tx, animalId: string): Promise<void>
}

export function createAfterwards() {
  const followers: Follower[] = []
  return {
    follow: (follower: Follower): void => void followers.push(follower),
    async deathStruck(tx: Tx, deathId: string): Promise<void> {
      for (const follower of followers) await follower.deathStruck(tx, deathId)
    },
    async placesChanged(tx: Tx, animalId: string): Promise<void> {
      for (const follower of followers) await follower.placesChanged(tx, animalId)
    },
  }
}

export type Afterwards = ReturnType<typeof createAfterwards>
