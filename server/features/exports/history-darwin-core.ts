import type { HistoryEvent } from '../../../shared/contracts/exports.contract.ts'
import type { CsvTable } from '../../platform/csv/csv-stream.ts'
import { eventDateOf } from './history-csv.ts'
import type { HistoryContent } from './read-history.ts'

/**
 * Terms of Darwin Core that a custody event fills, in the `dwc:` namespace; what has no term goes into
 * `dynamicProperties` as JSON.
 *
 * @source Darwin Core quick reference guide of TDWG: term names (V); basisOfRecord LivingSpecimen (M)
 */
export const darwinCoreColumns = [
  'dwc:occurrenceID',
  'dwc:basisOfRecord',
  'dwc:institutionCode',
  'dwc:ownerInstitutionCode',
  'dwc:catalogNumber',
  'dwc:otherCatalogNumbers',
  'dwc:organismID',
  'dwc:organismName',
  'dwc:organismScope',
  'dwc:scientificName',
  'dwc:vernacularName',
  'dwc:sex',
  'dwc:lifeStage',
  'dwc:individualCount',
  'dwc:eventID',
  'dwc:eventType',
  'dwc:eventDate',
  'dwc:recordedBy',
  'dwc:locality',
  'dwc:decimalLatitude',
  'dwc:decimalLongitude',
  'dwc:geodeticDatum',
  'dwc:coordinateUncertaintyInMeters',
  'dwc:disposition',
  'dwc:eventRemarks',
  'dwc:dynamicProperties',
] as const

const restOf = (event: HistoryEvent) =>
  JSON.stringify({
    countChange: event.delta,
    fromEnclosure: event.from?.code,
    toEnclosure: event.to?.code,
    otherAccession: event.otherAccession ?? undefined,
    transaction: event.transaction ?? undefined,
    counterparty: event.counterparty ?? undefined,
    reference: event.reference ?? undefined,
    sourceCode: event.sourceCode ?? undefined,
    permits: event.permits.map((permit) => `${permit.authority} ${permit.permitNumber}`),
  })

/** One event a row in the terms of Darwin Core; struck-out events are left out, since no term says so. */
export function historyDarwinCore(content: HistoryContent, facility: string, zone: string): CsvTable {
  const others = [
    ...content.identifiers.map((mark) => mark.value),
    ...content.events.flatMap((event) => event.theirNumber ?? []),
  ].join(' | ')
  const collected = content.origins.find((one) => one.kind === 'collected')
  return {
    variant: 'literal',
    header: darwinCoreColumns,
    rows: content.events
      .filter((event) => event.voided === null)
      .map((event) => {
        // of what was released, where that was; of all else, where it came from
        const where = event.site ?? collected
        return [
          `urn:uuid:${event.eventId}`,
          'LivingSpecimen',
          facility,
          content.owner ?? facility,
          content.accession,
          others,
          `urn:uuid:${content.animalId}`,
          content.name,
          content.form === 'individual' ? 'multicellular organism' : 'group',
          content.scientificName,
          content.commonName,
          content.sex,
          content.lifeStage,
          event.countAfter,
          event.eventId,
          event.kind,
          eventDateOf(event, zone),
          event.recordedBy,
          where?.locality ?? null,
          where?.latitude ?? null,
          where?.longitude ?? null,
          where?.latitude == null ? null : 'WGS84',
          where?.uncertaintyMetres ?? null,
          event.countAfter === 0 ? event.kind : 'in collection',
          event.note,
          restOf(event),
        ]
      }),
  }
}
