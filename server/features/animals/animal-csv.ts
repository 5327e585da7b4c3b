import type { AnimalRow } from '../../../shared/contracts/animals.contract.ts'
import {
  animalColumns as headers,
  basisNames,
  formNames,
  lockNames,
  quarantineKindNames,
  sexNames,
  stageNames,
  taxonGroupNames,
} from '../../../shared/messages/animals.ts'

type Column = { header: string; value: (row: AnimalRow) => string | number | null }

/** Columns of the list of animals as a file. */
export const animalCsvColumns = (): Column[] => [
  { header: headers.accession, value: (row) => row.accession },
  { header: headers.form, value: (row) => formNames[row.form] },
  { header: headers.name, value: (row) => row.name },
  { header: headers.commonName, value: (row) => row.taxon.commonName },
  { header: headers.scientificName, value: (row) => row.taxon.scientificName },
  { header: headers.group, value: (row) => taxonGroupNames[row.taxon.group] },
  { header: headers.quarantineKind, value: (row) => quarantineKindNames[row.taxon.quarantineKind] },
  { header: headers.sex, value: (row) => sexNames[row.sex] },
  { header: headers.stage, value: (row) => stageNames[row.stage] },
  { header: headers.enclosure, value: (row) => row.place?.code ?? null },
  { header: headers.area, value: (row) => row.place?.area ?? null },
  { header: headers.since, value: (row) => row.sinceKnownOn ?? row.since },
  { header: headers.count, value: (row) => row.count.ledger },
  { header: headers.countBasis, value: (row) => basisNames[row.count.basis] },
  { header: headers.countLow, value: (row) => row.count.low },
  { header: headers.countHigh, value: (row) => row.count.high },
  { header: headers.weight, value: (row) => row.newestWeight?.weightKg ?? null },
  { header: headers.weighedOn, value: (row) => row.newestWeight?.happenedOn ?? null },
  {
    header: headers.weightBasis,
    value: (row) => (row.newestWeight ? basisNames[row.newestWeight.basis] : null),
  },
  { header: headers.movement, value: (row) => lockNames[row.lock] },
  { header: headers.discrepancies, value: (row) => row.openDiscrepancies },
]
