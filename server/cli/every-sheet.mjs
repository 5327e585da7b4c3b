/**
 * Every address of the application with somebody who works there, for whoever has to look at all of them: the contact
 * sheet and the test of every sheet. `:code` and the like are filled with a row of `list`, the first that `where` takes, or
 * with `fill`.
 *
 * @typedef {{ name: string, as: string, address: string, list?: string, fill?: string, where?: (row: Record<string, unknown>) => boolean }} Sheet
 */
const ofQuarantineTank = { list: '/api/enclosures', where: (row) => row.code === 'QT-1' }

/** @type {readonly Sheet[]} */
export const everySheet = [
  { name: 'today', as: 'vet', address: '/' },
  { name: 'today-keeper', as: 'keeper', address: '/' },
  { name: 'today-registrar', as: 'registrar', address: '/' },
  { name: 'today-admin', as: 'admin', address: '/' },
  { name: 'water', as: 'tech', address: '/water' },
  { name: 'water-map', as: 'tech', address: '/water/map' },
  { name: 'enclosure-new', as: 'tech', address: '/water/new' },
  { name: 'enclosure', as: 'vet', address: '/enclosures/:code', ...ofQuarantineTank },
  { name: 'enclosure-edit', as: 'tech', address: '/enclosures/:code/edit', ...ofQuarantineTank },
  { name: 'enclosure-measure', as: 'keeper', address: '/enclosures/:code/measure', ...ofQuarantineTank },
  {
    name: 'enclosure-readings',
    as: 'keeper',
    address: '/enclosures/:code/readings',
    ...ofQuarantineTank,
  },
  { name: 'enclosure-volume', as: 'tech', address: '/enclosures/:code/volume', ...ofQuarantineTank },
  { name: 'enclosure-volumes', as: 'tech', address: '/enclosures/:code/volumes', ...ofQuarantineTank },
  { name: 'quarantine', as: 'vet', address: '/quarantine' },
  { name: 'quarantine-table', as: 'keeper', address: '/quarantine?rows=table' },
  { name: 'case', as: 'vet', address: '/quarantine/:number', list: '/api/cases' },
  { name: 'case-new', as: 'tech', address: '/quarantine/new' },
  { name: 'clearance', as: 'vet', address: '/quarantine/:number/clearance', list: '/api/cases' },
  { name: 'rounds', as: 'keeper', address: '/rounds' },
  { name: 'observe', as: 'keeper', address: '/enclosures/:code/observe', list: '/api/enclosures' },
  { name: 'unsent', as: 'keeper', address: '/unsent' },
  { name: 'animals', as: 'keeper', address: '/animals' },
  {
    name: 'animal',
    as: 'vet',
    address: '/animals/:accession',
    list: '/api/animals',
    where: (row) => row.form === 'individual',
  },
  {
    name: 'group',
    as: 'keeper',
    address: '/animals/:accession',
    list: '/api/animals',
    where: (row) => row.form === 'group',
  },
  { name: 'register', as: 'registrar', address: '/register' },
  { name: 'acquisition-new', as: 'registrar', address: '/register/acquisitions/new' },
  { name: 'disposition-new', as: 'registrar', address: '/register/dispositions/new' },
  {
    name: 'transaction',
    as: 'registrar',
    address: '/register/transactions/:number',
    list: '/api/register/transactions',
  },
  { name: 'history', as: 'registrar', address: '/register/histories/:accession', list: '/api/animals' },
  { name: 'permits', as: 'registrar', address: '/register/permits' },
  { name: 'permit-new', as: 'registrar', address: '/register/permits/new' },
  { name: 'permit', as: 'registrar', address: '/register/permits/:number', list: '/api/register/permits' },
  { name: 'exports', as: 'registrar', address: '/register/exports' },
  { name: 'bench', as: 'tech', address: '/bench' },
  { name: 'calculator', as: 'tech', address: '/bench/:calculator', fill: 'bath-dose' },
  { name: 'parties', as: 'registrar', address: '/register/parties' },
  { name: 'check', as: 'registrar', address: '/check' },
  { name: 'check-print', as: 'vet', address: '/check/:fingerprint', fill: '0123456789ABCDEF' },
  { name: 'orders', as: 'tech', address: '/orders' },
  { name: 'order-new', as: 'vet', address: '/orders/new' },
  { name: 'dose-by-weight', as: 'vet', address: '/orders/by-weight' },
  {
    name: 'order',
    as: 'vet',
    address: '/orders/:number',
    list: '/api/orders',
    where: (row) => row.phase === 'in-progress',
  },
  {
    name: 'bath-sheet',
    as: 'tech',
    address: '/orders/:number/sheet',
    list: '/api/orders',
    where: (row) => row.phase === 'in-progress',
  },
  {
    name: 'order-held',
    as: 'keeper',
    address: '/orders/:number',
    list: '/api/orders',
    where: (row) => row.phase === 'held',
  },
  {
    name: 'order-edit',
    as: 'vet',
    address: '/orders/:number/edit',
    list: '/api/orders',
    where: (row) => row.phase === 'draft',
  },
  { name: 'pharmacy', as: 'tech', address: '/pharmacy' },
  { name: 'formulary', as: 'tech', address: '/pharmacy/formulary' },
  { name: 'dose-line', as: 'tech', address: '/pharmacy/formulary/:id', list: '/api/formulary' },
  { name: 'settings', as: 'vet', address: '/settings' },
  { name: 'settings-own', as: 'vet', address: '/settings/own' },
  { name: 'people', as: 'admin', address: '/settings/people' },
  { name: 'person-new', as: 'admin', address: '/settings/people/new' },
  { name: 'person', as: 'admin', address: '/settings/people/:id', list: '/api/people' },
  { name: 'facility', as: 'admin', address: '/settings/facility' },
  { name: 'rules', as: 'vet', address: '/settings/rules' },
  { name: 'audit', as: 'admin', address: '/settings/audit' },
  { name: 'not-found', as: 'keeper', address: '/nowhere' },
]

/**
 * The address with its part filled in.
 *
 * @param {Sheet} sheet
 * @param {(address: string) => Promise<Record<string, unknown>>} get the body of an answer, asked for as the sheet's person
 * @returns {Promise<string | null>} null when the list has no such row
 */
export async function addressOf({ address, list, fill, where }, get) {
  const name = /:(\w+)/.exec(address)?.[1]
  if (name === undefined) return address
  if (list === undefined) return address.replace(`:${name}`, fill ?? '')
  const rows = Object.values(await get(list)).find(Array.isArray) ?? []
  const row = rows.find((each) => where?.(each) ?? true)
  return row ? address.replace(`:${name}`, encodeURIComponent(String(row[name]))) : null
}
