import type {
  AnimalForm,
  IdentifierKind,
  LifeStage,
  Sex,
} from '../../../shared/domain/animals/description.ts'
import { countKinds, isDeathKind } from '../../../shared/domain/ledger/count-entry.ts'
import type { CountKind } from '../../../shared/domain/ledger/count-entry.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import { isRepeated } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { Animal } from './animal.entity.ts'
import * as animals from './animals.repository.ts'
import { birthColumns } from './identify.service.ts'
import type { Birth, Identify } from './identify.service.ts'
import * as repository from './ledgers.repository.ts'
import { subjectOf } from './moves.service.ts'
import type { JudgedMove, MoveParts, Moves } from './moves.service.ts'
import { refuseField } from './refuse.ts'
import { findTaxon } from './taxa.repository.ts'
import { labelsOf, sayLocks } from './water-locks.ts'

export interface Accession {
  /** Id of the new animal or group, made by whoever records it. */
  id: string
  form: AnimalForm
  taxonId: string
  name?: string | null
  sex: Sex
  stage: LifeStage
  birth?: Birth | null
  /** Whole animals by which the ledger begins; 1 for an individual. */
  count: number
  /** For a group that nobody could count: the range. */
  estimate?: { low: number; high: number }
  /** How they came, in the registrar's trade terms. */
  kind: CountKind
  enclosureId: string
  identifiers?: {
    id: string
    kind: IdentifierKind
    value: string
    place?: string
    readTwiceReason?: string
  }[]
  happenedAt: string
  /** It has happened: an arrival in held water is kept and marked instead of being refused. True unless told. */
  isFact?: boolean
}

export interface CountChange {
  /** Id of the ledger line, which makes a retry harmless. */
  id: string
  animalId: string
  kind: CountKind
  /** Whole animals, more than 0; the kind says which way. */
  count: number
  reason?: string | null
  happenedAt: string
  /** What is recorded has happened: an excess is kept as a discrepancy instead of being refused. */
  isFact: boolean
  /** It would leave before its wait after a dose is over; refused before by whoever asks, kept when it has happened. */
  waits?: { until: string; drug: string; order: string } | null
  source: { kind: string; id: string }
}

/** What nobody decides on, or what does not come over the threshold: a lock on movement does not speak of it. */
const befalls = new Set<CountKind>([
  'death',
  'euthanasia',
  'escape',
  'theft',
  'lost-from-count',
  'birth-or-hatch',
  'propagation',
])

/** What the register and other features write of animals, inside a transaction of their own. */
export function createAccession(parts: MoveParts & { moves: Moves; identify: Identify }) {
  const { facility, ledgers, moves } = parts

  /** Locks against leaving the house, or against coming into a group that is here. */
  async function locksOnThreshold(
    tx: Tx,
    animalId: string,
    given: { enclosureId: string | null; leaves: boolean; at: Date },
  ) {
    const { enclosureId, leaves, at } = given
    const bearing = await parts.waterLocks.bearingOn(tx, {
      animalId,
      fromId: leaves ? enclosureId : null,
      toId: leaves ? null : enclosureId,
      at,
    })
    const then = leaves
      ? [...bearing.own, ...bearing.leaves]
      : [...bearing.own, ...bearing.enters].filter(({ kind }) => kind === 'all')
    return then.length > 0
      ? { locks: then, breach: 'moved-under-lock' as const }
      : { locks: bearing.later, breach: 'moved-before-lock' as const }
  }

  return {
    /**
     * Enters an animal or group: accession number, description, first line of its ledger, first stay.
     *
     * @returns its accession number; `created` is false when the same accession was entered before
     * @refuses not-found (taxon, enclosure) | bad-input (an individual of other than 1) | in-the-future | id-already-used
     */
    async accessionAnimal(tx: Tx, given: Accession): Promise<{ accession: string; created: boolean }> {
      const times = await facility.timesOf(tx, given.happenedAt)
      const content = { id: given.id, form: given.form, recordedBy: tx.actor.personId }
      if (await isRepeated(tx, Animal, content))
        return { accession: (await animals.findAnimal(tx, given.id))?.accession ?? '', created: false }
      if (given.form === 'individual' && (given.count !== 1 || given.estimate))
        throw refuseField('bad-input', '/count', animalRefusals.individualIsOne)
      if (given.estimate && given.estimate.high < given.estimate.low)
        throw refuseField('bad-input', '/estimate', animalRefusals.countRange)
      if (!(await findTaxon(tx, given.taxonId)))
        throw refuseField('not-found', '/taxonId', animalRefusals.noSuchTaxon)
      const enclosure = await moves.findTarget(tx, given.enclosureId, times.happenedAt, '/enclosureId')

      const { enters } = await parts.waterLocks.bearingOn(tx, {
        animalId: null,
        fromId: null,
        toId: enclosure.id,
        at: times.happenedAt,
      })
      const held = befalls.has(given.kind) ? [] : enters.filter(({ kind }) => kind === 'all')
      if (held.length > 0 && given.isFact === false)
        throw refuseField(
          'movement-locked',
          '/enclosureId',
          animalRefusals.arrivalHeld({ code: enclosure.code, by: sayLocks(held) }),
        )

      const description = {
        taxonId: given.taxonId,
        name: given.name ?? null,
        sex: given.sex,
        stage: given.stage,
        ...birthColumns(given.birth ?? null),
      }
      const animal: Animal = {
        id: given.id,
        accession: await facility.nextNumber(tx, 'accession'),
        form: given.form,
        splitFromId: null,
        ...description,
        recordedAt: tx.at,
        recordedBy: tx.actor.personId,
        version: 1,
      }
      await animals.insertAnimal(tx, animal)
      await animals.insertDescription(tx, {
        id: parts.ids.next(),
        animalId: animal.id,
        ...description,
        reason: null,
        ...times,
      })
      await ledgers.post(
        tx,
        animal,
        { id: parts.ids.next(), kind: given.kind, delta: given.count, reason: null },
        times,
      )
      if (given.estimate)
        await repository.insertStatement(tx, {
          id: parts.ids.next(),
          animalId: animal.id,
          basis: 'estimated',
          ...given.estimate,
          note: null,
          ...times,
        })
      const arrivalId = parts.ids.next()
      const judged: JudgedMove = {
        reason: null,
        documentedTransfer: null,
        againstRule: held.length > 0 ? 'moved-under-lock' : null,
      }
      await repository.insertMove(tx, {
        id: arrivalId,
        animalId: animal.id,
        kind: 'arrival',
        fromEnclosureId: null,
        toEnclosureId: enclosure.id,
        ...judged,
        automatic: false,
        ...times,
      })
      await ledgers.rebuildStays(tx, animal.id)
      tx.audit({
        action: 'animal.accession',
        subject: subjectOf(animal),
        after: {
          form: given.form,
          taxonId: given.taxonId,
          count: given.count,
          estimate: given.estimate ? { ...given.estimate } : undefined,
          kind: given.kind,
          enclosure: enclosure.code,
          happenedAt: times.happenedAt.toISOString(),
        },
      })
      await moves.noteBreach(
        tx,
        animal,
        arrivalId,
        { judged: { ...judged, reason: given.kind }, by: labelsOf(held) },
        times,
        { from: '', to: enclosure.code },
      )
      for (const identifier of given.identifiers ?? [])
        await parts.identify.writeIdentifier(
          tx,
          animal,
          { ...identifier, happenedAt: given.happenedAt },
          times,
        )
      return { accession: animal.accession, created: true }
    },

    /**
     * Changes the count of an animal or group by something other than a death seen in the house: births, sales,
     * transfers, escapes. When the last one leaves, its stay ends with it.
     *
     * @returns what was posted, and the excess that a fact leaves behind as a discrepancy
     * @refuses not-found | count-too-small (not for facts) | movement-locked (leaving under a lock, not for facts)
     */
    async changeCount(
      tx: Tx,
      given: CountChange,
    ): Promise<{ postedCount: number; excessCount: number; created: boolean }> {
      const animal = (await animals.lockAnimals(tx, [given.animalId])).get(given.animalId)
      if (!animal) throw new Problem('not-found')
      const times = await facility.timesOf(tx, given.happenedAt)
      const earlier = await repository.findEntry(tx, given.id)
      if (earlier) {
        if (earlier.animalId !== animal.id || earlier.kind !== given.kind)
          throw new Problem('id-already-used')
        const postedCount = Math.abs(earlier.delta)
        return { postedCount, excessCount: given.count - postedCount, created: false }
      }
      const leaves = countKinds[given.kind] === 'out'
      const enclosureId = await ledgers.placeAt(tx, animal.id, times.happenedAt)
      const code =
        enclosureId === null
          ? ''
          : ((await animals.findEnclosures(tx, [enclosureId])).get(enclosureId)?.code ?? '')
      const { locks, breach } = befalls.has(given.kind)
        ? { locks: [], breach: 'moved-under-lock' as const }
        : await locksOnThreshold(tx, animal.id, { enclosureId, leaves, at: times.happenedAt })
      if (!given.isFact && locks.length > 0)
        throw new Problem('movement-locked', {
          detail: animalRefusals.movementLocked({ accession: animal.accession, by: sayLocks(locks) }),
        })
      const posted = await ledgers.post(
        tx,
        animal,
        {
          id: given.id,
          kind: given.kind,
          delta: leaves ? -given.count : given.count,
          reason: given.reason ?? null,
        },
        times,
      )
      if (posted.excessCount > 0 && !given.isFact)
        throw refuseField(
          'count-too-small',
          '/count',
          animalRefusals.countTooSmall({
            accession: animal.accession,
            available: posted.postedCount,
            wanted: given.count,
          }),
        )
      tx.audit({
        action: 'animal.change-count',
        subject: subjectOf(animal),
        after: {
          kind: given.kind,
          count: given.count,
          posted: posted.postedCount,
          reason: given.reason ?? undefined,
        },
      })
      // A death is a death, whoever records it: quarantine and the chart find it where all deaths are
      if (isDeathKind(given.kind))
        await repository.insertDeath(tx, {
          id: parts.ids.next(),
          animalId: animal.id,
          kind: given.kind === 'death' ? 'died-seen' : 'euthanised',
          seenCount: given.count,
          postedCount: posted.postedCount,
          countEntryId: posted.entryId,
          enclosureId,
          carcassState: null,
          carcassPlace: null,
          note: given.reason ?? null,
          ...times,
        })
      if (locks.length > 0)
        await ledgers.openDiscrepancy(tx, animal, {
          kind: breach,
          source: given.source,
          facts: {
            from: leaves ? code : '',
            to: leaves ? '' : code,
            by: labelsOf(locks),
            reason: given.kind,
          },
          times,
        })
      if (given.waits)
        await ledgers.openDiscrepancy(tx, animal, {
          kind: 'left-before-withdrawal',
          source: given.source,
          facts: { ...given.waits, cause: given.kind },
          times,
        })
      if (posted.excessCount > 0)
        await ledgers.openDiscrepancy(tx, animal, {
          kind: 'more-than-counted',
          source: given.source,
          facts: {
            seen: given.count,
            posted: posted.postedCount,
            excess: posted.excessCount,
            cause: given.kind,
          },
          times,
        })
      await ledgers.settlePlace(tx, animal, given.source)
      return { postedCount: posted.postedCount, excessCount: posted.excessCount, created: true }
    },
  }
}
