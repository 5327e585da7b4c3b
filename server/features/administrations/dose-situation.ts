import type { Product } from '../../../shared/contracts/formulary.contract.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import type { CautionSettings } from '../../../shared/domain/cautions/caution-rule.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import type { CautionAnswer } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { checkDrift } from '../../../shared/domain/dose/check-drift.ts'
import type { MarksOnFile } from '../../../shared/domain/dose/judge-mark.ts'
import type { Drift } from '../../../shared/domain/dose/check-drift.ts'
import type { OrderJudgement } from '../../../shared/domain/orders/judge-bath-order.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { plannedDoses } from '../../../shared/domain/orders/planned-doses.ts'
import type { PlannedDose } from '../../../shared/domain/schedule/plan-doses.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { known } from '../../../shared/domain/cautions/fact.ts'
import type { Db } from '../../platform/database/db.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Animals } from '../animals/index.ts'
import { placeReads } from '../enclosures/index.ts'
import { saidAnimal } from '../orders/index.ts'
import type { EventReadRow, OrderQueries, Orders, SignedOrder } from '../orders/index.ts'
import type { SigningService } from '../signing/index.ts'
import { readDoses, stands } from './administrations.reads.ts'
import type { DoseReadRow } from './administrations.reads.ts'
import { readSignedOverrides } from './signed-overrides.ts'
import type { SignedOverride } from './signed-overrides.ts'

export interface DoseSituation {
  row: OrderRow
  /** Null where every signed version is gone: what happened is recorded all the same. */
  versionId: string | null
  /** False where the signed text cannot be read or was changed: `content` is then what the columns tell, and nothing is worked out. */
  readable: boolean
  content: SignedOrder
  block: SignatureBlock
  planned: PlannedDose
  /** Every planned dose of the version in force. */
  plan: PlannedDose[]
  /** Enclosures whose animals share the treated water; the order's own while the water cannot be read. */
  enclosureIds: string[]
  /** Holds and ends of the order, the newest first. */
  events: EventReadRow[]
  /** Every record of the order's doses that stands, over all versions. */
  records: DoseReadRow[]
  /** Those that were struck out. */
  struck: DoseReadRow[]
  product: Product | null
  /** The order worked out again by the facts of the instant; null where the water cannot be read any more. */
  judgement: OrderJudgement | null
  /** Which figures somebody changed past the program, in words; nothing is worked out from them. */
  changed: string[]
  answer: CautionAnswer | null
  /** The facility's thresholds in force at that instant. */
  settings: CautionSettings
  /** What the answer was judged by; null where nothing could be. */
  facts: CautionFacts | null
  /** The lot it was judged for: the one in the hand, or the one of the order. */
  lotId: string | null
  /** The instant it was judged for. */
  at: string
  /** Stops at this dose that a veterinarian overrode, each checked now. */
  overrides: SignedOverride[]
  drift: Drift | null
  /** What is on file of how high the water stands. */
  marks: MarksOnFile
  /** The animals that the order names; `isHere` null while the water cannot be read. */
  treated: { animalId: string; name: string; isHere: boolean | null }[]
  /** Records of the order's doses that a veterinarian has yet to explain. */
  unexplained: number
}

/** The treated animals that are not in the water any more: moved, dead, gone. */
export function goneOf({ treated }: Pick<DoseSituation, 'treated'>): { all: boolean; names: string[] } {
  const gone = treated.filter(({ isHere }) => isHere === false)
  return { all: gone.length > 0 && gone.length === treated.length, names: gone.map(({ name }) => name) }
}

export interface DoseSituationParts {
  dataSource: Db
  orders: Orders
  queries: OrderQueries
  animals: Animals
  signing: SigningService
}

/** What is known of an order's earlier doses goes into the facts of its spacing. */
function withSpacing(
  facts: CautionFacts,
  content: SignedOrder,
  records: readonly DoseReadRow[],
): CautionFacts {
  const given = records.filter(wentIn)
  const { intervalHours, doses } = content.fields
  const last = given.at(-1)?.happened_at.toISOString() ?? null
  const dosesGiven = known(
    new Set(given.map((record) => record.dose_key)).size,
    null,
    'the doses recorded here',
  )
  const dosesStillIn = known(
    given.filter(({ stop_at }) => stop_at === null).length,
    null,
    'the doses recorded here',
  )
  const order = { ...facts.order, dosesGiven, dosesStillIn }
  if (intervalHours === null) return { ...facts, order }
  const spacing = {
    intervalHours,
    lastGivenAt: last,
    givenDoses: given.length,
    plannedDoses: doses,
    readingDriven: false,
  }
  return {
    ...facts,
    order: { ...order, spacing: known(spacing, null, 'the doses recorded here') },
  }
}

async function readFillMark(db: Db, enclosureId: string): Promise<MarksOnFile['fillMark']> {
  const row = await placeReads.readEnclosure(db, { id: enclosureId })
  if (!row || row.fill_mark_entered_value === null || row.fill_mark_entered_unit === null) return null
  const volume = { value: row.fill_mark_entered_value, unit: row.fill_mark_entered_unit as UnitCode }
  return { mark: row.fill_mark ?? '', volume }
}

/** The stand-in of an unreadable order with the animals that its columns name. */
async function standIn(
  { animals, dataSource }: DoseSituationParts,
  order: SignedOrder,
  at: Date,
  db: Db = dataSource,
): Promise<SignedOrder> {
  const { animalIds, enclosureId } = order.fields
  // where nothing says whom it was for, it was for whoever was there
  const named =
    animalIds.length > 0
      ? await animals.questions.animalsById(animalIds, at, db)
      : await animals.questions.animalsIn([enclosureId], at, db)
  return { ...order, water: { ...order.water, animals: named.map((animal) => saidAnimal(animal, true)) } }
}

/** The animals that the signature names, and whether they are among those in the water. */
function treatedOf({ water }: SignedOrder, here: readonly string[] | null): DoseSituation['treated'] {
  return water.animals
    .filter(({ treated }) => treated)
    .map(({ animalId, accession, commonName }) => ({
      animalId,
      name: `${accession} ${commonName}`,
      isHere: here && here.includes(animalId),
    }))
}

/** The doses that a signed version plans, by the clock of its signature. */
export const planOf = (fields: SignedOrder['fields'], block: SignatureBlock): PlannedDose[] =>
  plannedDoses(
    {
      startsAt: fields.startsAt ?? block.signedAt,
      doses: fields.doses,
      intervalHours: fields.intervalHours,
    },
    block.zone,
  )

/** A dose whose plan is gone with the order: that of the key it was recorded under, with no time of its own. */
const unplanned = (key: string, { signedAt }: SignatureBlock): PlannedDose => ({
  key,
  dueAt: signedAt,
  opensAt: signedAt,
  closesAt: signedAt,
})

/**
 * One planned dose of the signed version in force, worked out and judged again by the facts of an instant: now before
 * a dose, or the time of a dose that is being recorded.
 *
 * @param lotId the lot in the hand; the one of the order while none is named
 */
export async function readDoseSituation(
  parts: DoseSituationParts,
  number: string,
  key: string,
  at: Date,
  options: { lotId?: string | null; db?: Db } = {},
): Promise<DoseSituation> {
  const sealed = await parts.queries.sealedForDose(number)
  const readable = sealed.content !== null
  const content = sealed.content ?? (await standIn(parts, sealed.standIn, at, options.db))
  const { fields } = content
  const plan = sealed.versionId === null ? [unplanned(key, sealed.block)] : planOf(fields, sealed.block)
  const planned = plan.find((dose) => dose.key === key)
  if (!planned) throw new Problem('not-found', { detail: 'The order plans no such dose.' })
  const db = options.db ?? parts.dataSource
  const all = await readDoses(db, sealed.row.id)
  const records = all.filter(stands)
  const lotId = options.lotId ?? fields.lotId
  const found = readable
    ? await parts.orders.judge({ ...fields, lotId }, at, {
        db,
        exceptOrderId: sealed.row.id,
        stage: 'start',
      })
    : null
  const judgement = found?.judgement ?? null
  const settings = found?.settings ?? {}
  const facts = judgement && withSpacing(judgement.facts, content, records)
  const volumeNow = found?.situation.water.volume?.netVolumeLitres ?? null
  const drift =
    volumeNow === null
      ? null
      : checkDrift(content.volume.netVolumeLitres, volumeNow, fields.allowedVolumeDriftPercent)
  return {
    row: sealed.row,
    versionId: sealed.versionId,
    readable,
    content,
    block: sealed.block,
    planned,
    plan,
    enclosureIds: found?.situation.water.enclosures.map(({ id }) => id) ?? [fields.enclosureId],
    events: await parts.queries.events(sealed.row.id),
    records,
    struck: all.filter((one) => !stands(one)),
    product: found?.product ?? null,
    judgement,
    changed: found?.changed ?? [],
    facts,
    lotId,
    settings,
    at: at.toISOString(),
    overrides:
      sealed.versionId === null
        ? []
        : await readSignedOverrides(db, parts.signing, { orderVersionId: sealed.versionId, key }),
    answer:
      facts &&
      evaluateCautions({
        facts,
        stage: 'start',
        settings,
        factsAtSigning: content.facts as unknown as CautionFacts,
      }),
    drift: drift?.ok ? drift.value : null,
    marks: {
      depths: found?.situation.water.volume?.depths ?? [],
      fillMark: await readFillMark(db, fields.enclosureId),
    },
    treated: treatedOf(content, found && found.situation.animals.map(({ animalId }) => animalId)),
    unexplained: await parts.animals.questions.openDiscrepanciesOfDoses(
      records.map(({ id }) => id),
      db,
    ),
  }
}
