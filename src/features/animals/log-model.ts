import type { LogLine } from '../../../shared/contracts/animals.contract.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import {
  animalLogWords as words,
  discrepancyNames,
  outcomeNames,
} from '../../../shared/messages/animal-log.ts'
import {
  basisNames,
  carcassStateNames,
  countKindNames,
  deathKindNames,
  identifierKindNames,
  sexNames,
  stageNames,
} from '../../../shared/messages/animals.ts'
import { capital } from '../../../shared/messages/capital.ts'
import { roleNames } from '../../../shared/messages/permissions.ts'

type Catalogue = Readonly<Record<string, unknown>>

/** The words for a code that came over the wire; the code itself when this program does not know it. */
function named(catalogue: Catalogue, code: string): string {
  const word = Object.hasOwn(catalogue, code) ? catalogue[code] : undefined
  return typeof word === 'string' ? word : code
}

const signed = (delta: number) => (delta < 0 ? `\u2212${String(-delta)}` : `+${String(delta)}`)

/** One line of the log as a sentence. */
export function sayLogLine(line: Pick<LogLine, 'kind' | 'facts'>): string {
  const { facts } = line
  const text = (key: string) => String(facts[key] ?? '')
  const figure = (key: string) => Number(facts[key] ?? 0)
  switch (line.kind) {
    case 'weight': {
      const unit = text('unit')
      const weight = isUnitCode(unit) ? formatReading({ value: text('value'), unit }).text : text('value')
      const basis = named(basisNames, text('basis'))
      if (figure('animals') > 1) return words.weighedTogether({ weight, count: figure('animals'), basis })
      return words.weighed({ weight, basis, method: text('method'), kept: text('confirmedReason') })
    }
    case 'move': {
      const places = { from: text('from'), to: text('to'), reason: text('reason') }
      if (facts['from'] === null) return words.arrived(places)
      if (facts['to'] === null) return words.left(places)
      if (text('againstRule')) return words.movedAgainst(places)
      if (text('transfer')) return words.transferred({ ...places, words: text('transfer') })
      return words.moved(places)
    }
    case 'death': {
      const how = named(deathKindNames, text('death'))
      const [seen, posted] = [figure('seen'), figure('posted')]
      if (posted < seen) return words.diedMore({ seen, posted, how })
      const state = text('state') && named(carcassStateNames, text('state'))
      return words.died({
        how: seen === 1 ? capital(how) : `${String(seen)} ${how}`,
        state,
        note: text('note'),
      })
    }
    case 'count': {
      const change = capital(named(countKindNames, text('change')))
      const delta = signed(figure('delta'))
      if (text('other')) return words.countedWith({ change, delta, other: text('other') })
      return words.counted({ change, delta, reason: text('reason') })
    }
    case 'statement':
      return text('basis') === 'counted'
        ? words.statedCount({ count: figure('low') })
        : words.statedEstimate({ low: figure('low'), high: figure('high') })
    case 'description':
      return words.described({
        taxon: text('taxon'),
        name: text('name'),
        sex: named(sexNames, text('sex')),
        stage: named(stageNames, text('stage')),
        reason: text('reason'),
      })
    case 'food-or-release':
      return text('answer') === 'yes'
        ? words.mayBeFood({ reason: text('reason') })
        : words.neverFood({ reason: text('reason') })
    case 'mark':
      return words.marked({
        mark: named(identifierKindNames, text('mark')),
        value: text('value'),
        place: text('place'),
      })
    case 'mark-ended':
      return words.markEnded({
        mark: capital(named(identifierKindNames, text('mark'))),
        value: text('value'),
        reason: text('reason'),
      })
    case 'lock': {
      const given = { source: text('source'), reason: text('reason') }
      return text('lock') === 'all' ? words.heldStill(given) : words.quarantined(given)
    }
    case 'lock-lifted':
      return words.freed({ source: text('source'), reason: text('reason') })
    case 'discrepancy':
      return words.opened({
        what: named(discrepancyNames, text('discrepancy')),
        role: named(roleNames, text('forRole')),
      })
    case 'discrepancy-resolved':
      return words.resolved({ outcome: named(outcomeNames, text('outcome')), reason: text('reason') })
    default:
      return line.kind
  }
}
