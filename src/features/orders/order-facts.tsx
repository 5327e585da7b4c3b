import type { ReactNode } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import type { SignedBathOrder } from '../../../shared/contracts/signed-order.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { agentNames, basisNames } from '../../../shared/messages/formulary.ts'
import { orderViewWords as words, settingNames } from '../../../shared/messages/orders-screens.ts'
import { sayDate, sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { Facts } from '../../ui/facts.tsx'
import { formularyQuery } from '../formulary/index.ts'
import { doseOfEntered, dosesText } from './order-parts.tsx'
import { DoseText } from './dose-text.tsx'

type Fact = readonly [term: string, value: ReactNode]
const open = <span className="t-2">{words.notYet}</span>

/** What every order says, signed or not, in the order of parts: dose, route, frequency, duration. */
function commonFacts(fields: BathOrderFields, zone: string): Fact[] {
  return [
    [words.route, words.routeText],
    [words.doses, dosesText(fields)],
    [
      words.contact,
      fields.timing === 'indefinite'
        ? words.leftIn
        : fields.timing === 'timed' && fields.contactMinutes !== null
          ? formatDose(fields.contactMinutes, 'min').text
          : open,
    ],
    [words.first, fields.startsAt === null ? open : sayInstantWithOffset(fields.startsAt, zone)],
    [words.problem, fields.problem || open],
    [
      words.use,
      fields.use === null ? open : fields.use === 'extralabel' ? words.extralabel : words.asLabelled,
    ],
    [words.setting, fields.setting === null ? open : settingNames[fields.setting]],
    [words.stopIf, fields.stopIf || open],
    [words.how, fields.instructions || open],
    [
      words.division,
      fields.division ? <DoseText key="division" text={doseOfEntered(fields.division)} /> : open,
    ],
    [words.drift, words.driftText({ percent: formatDose(fields.allowedVolumeDriftPercent, 'percent').text })],
  ]
}

/** A signed order as a document: everything it says, from the signed text alone. */
export function SignedFacts({ content, zone }: { content: SignedBathOrder; zone: string }) {
  const { product, lot, doseLine } = content
  return (
    <Facts
      of={[
        [words.drug, <b key="drug">{product.establishedName}</b>],
        [
          words.product,
          <>
            {product.productName}
            {', '}
            <DoseText text={doseOfEntered(product.strength)} />{' '}
            {basisNames[product.strengthBasis as keyof typeof basisNames]}
          </>,
        ],
        [
          words.lot,
          lot ? words.lotText({ lot: lot.lotNumber, expires: sayDate(lot.expiresOn) }) : words.noLot,
        ],
        [
          words.target,
          <>
            <DoseText text={content.targetText} size="strong" /> {content.basisText}
          </>,
        ],
        [
          words.line,
          doseLine
            ? words.lineText({ range: doseLine.text, citation: doseLine.citation, mark: doseLine.mark })
            : words.noLine,
        ],
        ...commonFacts(content.fields, zone),
      ]}
    />
  )
}

/** An order that is being written, for those who may only read it. */
export function DraftFacts({ fields, zone }: { fields: BathOrderFields; zone: string }) {
  const { data } = useQuery(formularyQuery)
  const product = data?.products.find((one) => one.id === fields.productId)
  return (
    <Facts
      of={[
        [words.drug, product ? <b key="drug">{agentNames[product.agent]}</b> : open],
        [
          words.product,
          product ? (
            <>
              {product.productName}
              {', '}
              {product.record === 'broken' ? (
                words.notAsEntered
              ) : (
                <>
                  <DoseText text={doseOfEntered(product.strength)} /> {basisNames[product.strengthBasis]}
                </>
              )}
            </>
          ) : (
            open
          ),
        ],
        [
          words.animals,
          fields.animalIds.length === 0 ? open : words.animalsChosen({ count: fields.animalIds.length }),
        ],
        [
          words.target,
          fields.target ? (
            <>
              <DoseText text={doseOfEntered(fields.target)} size="strong" />{' '}
              {fields.basis ? basisNames[fields.basis] : open}
            </>
          ) : (
            open
          ),
        ],
        ...commonFacts(fields, zone),
      ]}
    />
  )
}
