import type { AnsweredCaution } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields, SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { CautionSettings } from '../../../shared/domain/cautions/caution-rule.ts'
import type { BathDose } from '../../../shared/domain/dose/bath-dose.ts'
import type { SignedAnswer } from '../../../shared/domain/orders/signed-answers.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { agentNames, basisNames } from '../../../shared/messages/formulary.ts'
import type { WaterFacts } from '../water/index.ts'
import type { OrderSituation } from './order-situation.ts'
import { saidWater } from './preview-order.ts'
import { saidAmount, saidCautions, saidCondition, saidLine } from './say-order.ts'

/** Raised whenever the engines change in a way that could change a figure; stands in every signed order. */
export const engineVersion = 1

export interface Override extends AnsweredCaution {
  reason: string
}

/** Everything that a signature under an order covers, as it was signed; screens and papers are made from it alone. */
export interface SignedOrder {
  kind: 'bath-order'
  engineVersion: number
  number: string
  versionNo: number
  enclosure: { code: string; name: string }
  water: ReturnType<typeof saidWater>
  valves: { code: string; state: string }[]
  volume: {
    determinationId: string
    netVolumeLitres: number
    errorPercent: number | null
    method: string
    measuredOn: string
  }
  product: {
    id: string
    agent: string
    establishedName: string
    productName: string
    strength: { value: string; unit: string }
    strengthBasis: string
    densityGPerMl: number | null
  }
  lot: { id: string; lotNumber: string; expiresOn: string } | null
  doseLine: { id: string; text: string; citation: string; mark: string; state: string } | null
  fields: BathOrderFields
  targetText: string
  basisText: string
  amount: ReturnType<typeof saidAmount>
  working: ReturnType<typeof saidLine>[]
  cautions: SaidCaution[]
  conditions: ReturnType<typeof saidCondition>[]
  overrides: (SignedAnswer & { reason: string })[]
  read: (string | SignedAnswer)[]
  /** As it was read by the signer; absent in orders signed before it was asked for, null where the use is by the label. */
  relationship?: string | null
  /** The facility's thresholds that the cautions were judged by; orders signed earlier were judged by the defaults. */
  settings?: CautionSettings
  facts: Json
}

export interface ContentRequest {
  number: string
  versionNo: number
  enclosureName: string
  fields: BathOrderFields
  found: OrderSituation & { product: NonNullable<OrderSituation['product']> }
  dose: BathDose
  volume: NonNullable<WaterFacts['volume']>
  overrides: Override[]
  read: AnsweredCaution[]
  relationship: string | null
}

/** Puts the content of a signature together. */
export function contentOf(request: ContentRequest): SignedOrder {
  const { fields, found, dose, volume } = request
  const { situation, product, line, judgement } = found
  const { water, animals, base } = situation
  const lot = product.lots.find((one) => one.id === fields.lotId)
  const target = fields.target ?? { value: '', unit: 'mg/L' }
  return {
    kind: 'bath-order',
    engineVersion,
    number: request.number,
    versionNo: request.versionNo,
    enclosure: { code: water.enclosureCode, name: request.enclosureName },
    water: saidWater(water, animals, fields.animalIds),
    valves: water.connections.map(({ code, state }) => ({ code, state })),
    volume: {
      determinationId: volume.id,
      netVolumeLitres: volume.netVolumeLitres,
      errorPercent: volume.errorPercent,
      method: volume.method,
      measuredOn: volume.measuredOn,
    },
    product: {
      id: product.id,
      agent: product.agent,
      establishedName: agentNames[product.agent],
      productName: product.productName,
      strength: { value: product.strength.value, unit: product.strength.unit },
      strengthBasis: product.strengthBasis,
      densityGPerMl: product.densityGPerMl,
    },
    lot: lot ? { id: lot.id, lotNumber: lot.lotNumber, expiresOn: lot.expiresOn } : null,
    doseLine: line && {
      id: line.id,
      text: rangeText(line),
      citation: line.citation,
      mark: line.mark,
      state: line.state,
    },
    fields,
    targetText: formatDose(target.value, target.unit as UnitCode).text,
    basisText: fields.basis ? basisNames[fields.basis] : '',
    amount: saidAmount(dose),
    working: dose.working.map(saidLine),
    cautions: saidCautions(found),
    conditions: judgement?.answer.conditions.map((condition) => saidCondition(condition, base.zone)) ?? [],
    overrides: request.overrides,
    read: request.read,
    relationship: request.relationship,
    settings: found.settings,
    facts: JSON.parse(JSON.stringify(judgement?.facts ?? null)) as Json,
  }
}

function rangeText(line: { low: number | null; high: number; unit: string }): string {
  const high = formatDose(line.high, line.unit as UnitCode).text
  return line.low === null || line.low === line.high
    ? high
    : `${formatDose(line.low, line.unit as UnitCode).text} to ${high}`
}
