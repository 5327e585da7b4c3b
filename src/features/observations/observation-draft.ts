import type { recordObservation } from '../../../shared/contracts/observations.contract.ts'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { isSomethingSaid } from '../../../shared/domain/observations/check-observation.ts'
import { allWell, nothingSaid } from '../../../shared/domain/observations/observation.ts'
import type { CountBasis, ObservationSaid } from '../../../shared/domain/observations/observation.ts'
import { typedText } from '../../lib/typed-text.ts'

export type ObservationBody = BodyOf<typeof recordObservation>

/** Version of this form; goes with every entry, so that one made long ago is still understood. */
export const observationForm = 1

/** What has been said on the form so far. Nothing is said beforehand. */
export interface ObservationDraft extends Omit<ObservationSaid, 'count' | 'words' | 'urgent'> {
  words: string
  countBasis: CountBasis | null
  countLow: string
  countHigh: string
  /** Bodies by the number of the animal or group that they belong to. */
  deadOf: Readonly<Record<string, number>>
}

const { count: _count, urgent: _urgent, words: _words, ...unsaid } = nothingSaid

export const emptyDraft: ObservationDraft = {
  ...unsaid,
  words: '',
  countBasis: null,
  countLow: '',
  countHigh: '',
  deadOf: {},
}

const { lookedAt, feeding, breathing, foundDead } = allWell
/** What one touch of "All well" says, and nothing beyond it. */
const well = { lookedAt, feeding, breathing, foundDead }

export const isAllWell = (draft: ObservationDraft): boolean =>
  (Object.keys(well) as (keyof typeof well)[]).every((key) => draft[key] === well[key])

/** "All well" said, or taken back: then those four are unsaid again. */
export function toggleAllWell(draft: ObservationDraft): ObservationDraft {
  if (!isAllWell(draft)) return { ...draft, ...well }
  return { ...draft, lookedAt: false, feeding: null, breathing: null, foundDead: null }
}

const whole = (text: string): number | null => (/^\d{1,8}$/.test(text.trim()) ? Number(text.trim()) : null)

/** The count as it is sent; undefined while its numbers have not been typed. */
function countOf(draft: ObservationDraft): ObservationSaid['count'] | undefined {
  const { countBasis } = draft
  if (countBasis === null) return null
  if (countBasis === 'not-counted') return { basis: 'not-counted' }
  const low = whole(draft.countLow)
  const high = countBasis === 'counted' ? low : whole(draft.countHigh)
  return low === null || high === null || high < low ? undefined : { basis: countBasis, low, high }
}

/** Whether a count was begun and its number not typed, which would be lost by saving. */
export const isCountOpen = (draft: ObservationDraft): boolean => countOf(draft) === undefined

function saidOf(draft: ObservationDraft, urgent: boolean): ObservationSaid {
  const { lookedAt, feeding, breathing, skin, signs, foundDead, unwell, handled, forVeterinarian } = draft
  return {
    lookedAt,
    feeding,
    breathing,
    skin,
    signs: [...signs],
    words: typedText(draft.words) ?? null,
    count: countOf(draft) ?? null,
    foundDead,
    unwell,
    handled,
    forVeterinarian,
    urgent,
  }
}

/** Whether there is something to save. */
export const isWorthSaving = (draft: ObservationDraft): boolean =>
  isSomethingSaid(saidOf(draft, false)) && !isCountOpen(draft)

/** Whether whoever is called for help would learn what is seen. */
export const saysWhatIsSeen = (draft: ObservationDraft): boolean =>
  typedText(draft.words) !== undefined || draft.signs.length > 0

/** The entry as it is sent. Ids and time are those of the tap, so that sending it again changes nothing. */
export function bodyOf(
  draft: ObservationDraft,
  of: {
    id: string
    enclosure: string
    happenedAt: string
    device: string
    online: boolean
    urgent: boolean
    newId: () => string
  },
): ObservationBody {
  const { foundDead } = draft
  return {
    ...saidOf(draft, of.urgent),
    signs: [...draft.signs],
    id: of.id,
    schemaVersion: observationForm,
    origin: of.online ? 'online' : 'outbox',
    device: of.device,
    happenedAt: of.happenedAt,
    enclosure: of.enclosure,
    deaths:
      (foundDead ?? 0) === 0
        ? []
        : Object.entries(draft.deadOf)
            .filter(([, count]) => count > 0)
            .map(([accession, count]) => ({ id: of.newId(), accession, count })),
    ...(of.urgent ? { noticeId: of.newId() } : {}),
  }
}

/** The form as it was when an entry was made, for mending one that was not taken. */
export function draftOf(body: ObservationBody): ObservationDraft {
  const { count } = body
  const numbers = count && count.basis !== 'not-counted' ? count : null
  return {
    lookedAt: body.lookedAt,
    feeding: body.feeding,
    breathing: body.breathing,
    skin: body.skin,
    signs: body.signs,
    foundDead: body.foundDead,
    // absent in an entry that a device kept since before they could be said
    unwell: (body as Partial<ObservationBody>).unwell ?? null,
    handled: (body as Partial<ObservationBody>).handled ?? null,
    forVeterinarian: body.forVeterinarian,
    words: body.words ?? '',
    countBasis: count?.basis ?? null,
    countLow: numbers ? String(numbers.low) : '',
    countHigh: numbers ? String(numbers.high) : '',
    deadOf: Object.fromEntries(body.deaths.map(({ accession, count: dead }) => [accession, dead])),
  }
}
