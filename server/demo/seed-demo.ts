import type { DataSource } from 'typeorm'
import { compose } from '../composition.ts'
import type { Clock } from '../platform/clock.ts'
import { settableClock } from '../platform/clock.ts'
import type { Log } from '../platform/log.ts'
import { seedAnimals, seedTaxa } from './animals.ts'
import { seedFormulary } from './formulary.ts'
import { seedOrders } from './orders.ts'
import { demoPassword, demoPeople, seedPeople } from './people.ts'
import { seedQuarantine } from './quarantine.ts'
import { seedRegister } from './register.ts'
import { seedWater } from './water.ts'

const seedLock = 4400_0003
const historyDays = 90

/**
 * Loads the practice scenario once, into an empty database only, through the same services that people use, on a
 * clock that walks from 90 days ago to now.
 */
export async function seedDemo(outside: {
  dataSource: DataSource
  clock: Clock
  log: Log
  dataFolder: string
}): Promise<boolean> {
  const runner = outside.dataSource.createQueryRunner()
  await runner.query('SELECT pg_advisory_lock($1)', [seedLock])
  try {
    const now = outside.clock.now()
    const clock = settableClock(new Date(now.getTime() - historyDays * 86_400_000))
    const composition = compose({ ...outside, clock, demo: true })
    if ((await composition.people.countPeople()) > 0) return false
    const actors = await seedPeople(composition)
    await composition.formulary.service.loadDefaults()
    await seedFormulary(composition, actors, now)
    const { enclosureIds, waterBodyIds, machineIds } = await seedWater(composition, {
      clock,
      now,
      people: actors,
    })
    const taxa = await seedTaxa(composition, actors)
    const register = await seedRegister(composition, { clock, now, people: actors, taxa })
    const animals = { clock, now, people: actors, enclosureIds, taxa, enter: register.enter }
    const seeded = await seedAnimals(composition, animals)
    await register.depart(seeded)
    await seedQuarantine(composition, { clock, now, people: actors, seeded, enclosureIds, waterBodyIds })
    await seedOrders(composition, { clock, now, people: actors, enclosureIds, waterBodyIds, machineIds })
    await composition.close()
    return true
  } finally {
    await runner.query('SELECT pg_advisory_unlock($1)', [seedLock])
    await runner.release()
  }
}

/** The lines that tell a newcomer how to sign in. */
export function demoAccountLines(): string[] {
  const rows = Object.entries(demoPeople).map(
    ([key, person]) =>
      `  ${`${key}@harrow-point.example`.padEnd(34)} ${person.name}, ${person.roles.join(', ')}`,
  )
  return [`Practice accounts, password ${demoPassword}:`, ...rows]
}
