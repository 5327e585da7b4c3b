import type { DocumentBlock, PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { basisNames } from '../../../shared/messages/formulary.ts'
import { labelPaper as words } from '../../../shared/messages/order-label.ts'
import { orderPaper } from '../../../shared/messages/orders.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { checkBlock } from '../../platform/pdf/check-block.ts'
import { signedFrame } from '../../platform/pdf/signed-frame.ts'
import { standingCaution } from '../../platform/pdf/standing-caution.ts'
import { orderNotice } from './order-document.ts'
import type { OrderPaper } from './order-document.ts'
import { sayTreated } from './say-order.ts'

export type LabelPaper = Omit<OrderPaper, 'recorded'> & {
  /** Where the veterinarian is to be found; empty where the settings do not say. */
  address: string
}

function contents({ content }: LabelPaper): DocumentBlock[] {
  const { product, lot } = content
  const strength = formatDose(product.strength.value, product.strength.unit as UnitCode).text
  const basis = basisNames[product.strengthBasis as keyof typeof basisNames]
  return [
    { kind: 'heading', text: words.contents },
    {
      kind: 'paragraph',
      text: [
        { text: product.establishedName, bold: true },
        { text: ` (${product.productName}), ${orderPaper.strength({ strength, basis })}` },
      ],
    },
    ...(lot
      ? [
          {
            kind: 'grid' as const,
            entries: [
              {
                label: words.lot,
                value: words.lotText({ lot: lot.lotNumber, expires: sayDate(lot.expiresOn) }),
              },
            ],
          },
        ]
      : [{ kind: 'pen' as const, fields: [{ label: words.lotToWrite }] }]),
  ]
}

function prescriber({ block, address }: LabelPaper): DocumentBlock[] {
  const { licence } = block
  const name = licence
    ? words.licence({
        name: block.printedName,
        number: licence.number,
        jurisdiction: licence.jurisdiction,
      })
    : block.printedName
  const entries = [{ label: words.prescribedBy, value: name }]
  return address === ''
    ? [
        { kind: 'grid', entries },
        { kind: 'pen', fields: [{ label: words.addressToWrite }] },
      ]
    : [{ kind: 'grid', entries: [...entries, { label: words.address, value: address }] }]
}

function directions({ content }: LabelPaper): DocumentBlock[] {
  const { fields, water, enclosure } = content
  const treated = water.animals.filter((animal) => animal.treated)
  const entries = [
    { label: words.animals, value: treated.map(sayTreated).join('; ') },
    { label: words.problem, value: fields.problem },
    { label: words.dosage, value: `${content.targetText} ${content.basisText}` },
    {
      label: words.route,
      value: words.intoWater({
        enclosure: `${enclosure.code}, ${enclosure.name}`,
        bodies: water.bodies.join(', '),
      }),
    },
    {
      label: words.frequency,
      value: orderPaper.dosesText({ doses: fields.doses, hours: fields.intervalHours }),
    },
    {
      label: words.duration,
      value:
        fields.timing === 'timed' && fields.contactMinutes !== null
          ? formatDose(fields.contactMinutes, 'min').text
          : orderPaper.contactIndefinite,
    },
    { label: words.use, value: fields.use === 'extralabel' ? words.extralabel : words.asLabelled },
    { label: words.amount, value: [{ text: words.amountText, bold: true }] },
    { label: words.withdrawal, value: words.withdrawalText },
    ...(fields.instructions === '' ? [] : [{ label: words.how, value: fields.instructions }]),
  ]
  return [
    { kind: 'heading', text: words.directions },
    { kind: 'grid', entries },
  ]
}

/** Rules on how an order is written: whoever handles the container has nothing to heed in them. */
const ofTheWriting: readonly string[] = ['R26', 'R48']

function cautions({ content }: LabelPaper): DocumentBlock[] {
  return [
    { kind: 'heading', text: words.cautions },
    ...content.cautions
      .filter(({ level, ruleId }) => level !== 'note' && !ofTheWriting.includes(ruleId))
      .map(({ level, title, text }): DocumentBlock => ({ kind: 'caution', level, title, lines: [text] })),
    { kind: 'caution', level: 'stop-if', lines: [content.fields.stopIf] },
    { kind: 'paragraph', text: words.keep },
  ]
}

/**
 * The label for a container of what is dispensed under an order, from the signed text alone.
 *
 * @source 21 CFR 530.12(a) to (e), as the treatments reference restates it (V): the veterinarian's name and address, established names, directions by class or number of the
 *         animals, dosage, frequency, route and duration, cautionary statements, withdrawal time
 */
export function orderLabelDocument(paper: LabelPaper): PdfDocumentModel {
  const { content, block } = paper
  const notice = orderNotice({ ...paper, versionNo: content.versionNo })
  return {
    title: words.title({ number: content.number, n: content.versionNo }),
    ...signedFrame(paper, notice),
    head: {
      facility: paper.facility,
      name: words.name,
      number: content.number,
      version: orderPaper.version({ n: content.versionNo }),
      source: words.source,
      subject: { name: content.enclosure.code, lines: [content.enclosure.name] },
    },
    blocks: [
      ...contents(paper),
      ...prescriber(paper),
      { kind: 'rule' },
      ...directions(paper),
      ...cautions(paper),
      checkBlock(paper.publicUrl, block.hash),
      standingCaution(),
    ],
  }
}
