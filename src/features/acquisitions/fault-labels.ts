import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'

const labels: Record<string, () => string> = {
  kind: () => words.how,
  stage: () => words.stage,
  on: () => words.on,
  time: () => words.time,
  counterpartyId: () => words.party,
  'newCounterparty.name': () => words.partyName,
  'newCounterparty.kind': () => words.partyKind,
  loanDueOn: () => words.loanDueOn,
  'place.on': () => words.placeOn,
  'place.latitude': () => words.latitude,
  'place.longitude': () => words.longitude,
  'place.uncertaintyMetres': () => words.uncertainty,
  'transport.boxCount': () => words.boxCount,
  'transport.sealedAt': () => words.sealedAt,
  'transport.openedAt': () => words.openedAt,
}

const inLine: Record<string, () => string> = {
  taxonId: () => words.taxon,
  animalId: () => words.animal,
  form: () => words.form,
  count: () => words.count,
  known: () => words.known,
  estimate: () => words.estimated,
  'estimate.low': () => words.low,
  'estimate.high': () => words.high,
  enclosureId: () => words.enclosure,
  deadOnArrival: () => words.deadOnArrival,
  birthDate: () => words.birthDate,
  sourceCode: () => words.sourceCode,
  permitId: () => words.permit,
  lineId: () => words.permitLine,
  quantity: () => words.permitQuantity,
  title: () => words.paperTitle,
  file: () => words.file,
}

/** The label of a field by its name in the form, for the summary of what has to change. */
export function faultLabel(name: string): string {
  const own = labels[name]
  if (own) return own()
  const [list, index, ...rest] = name.split('.')
  const inside = inLine[rest.join('.')]?.() ?? name
  if (list === 'lines') return `${words.line({ n: Number(index) + 1 })}, ${inside}`
  return inside
}
