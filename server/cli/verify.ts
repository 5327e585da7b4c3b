import { verifyOverrides } from '../features/administrations/index.ts'
import { verifyAnimals } from '../features/animals/index.ts'
import { verifyOrders } from '../features/orders/index.ts'
import { verifySignedEvents } from '../features/quarantine/index.ts'
import { verifyChain } from '../platform/audit/verify-chain.ts'
import { verifyRows } from '../platform/audit/verify-rows.ts'
import { verifyFiles } from '../platform/files/verify-files.ts'
import { withComposition } from './connect.ts'

// npm run verify: works out what is derived (stays, counts) from the ledgers again, checks what is stored beside
// signatures against what was signed, compares every kept row with the act in the audit trail that wrote it, reads every
// kept file again, and says where they differ
await withComposition(async ({ parts, signing, documents, exports }) => {
  const { dataSource } = parts
  const animals = await verifyAnimals(dataSource)
  const orders = await verifyOrders(dataSource, signing.service.signer)
  const cases = await verifySignedEvents(dataSource, signing.service)
  const overrides = await verifyOverrides(dataSource, signing.service)
  const chain = await verifyChain(dataSource)
  const rows = await verifyRows(dataSource)
  const onRecord = [...(await documents.filesOnRecord()), ...(await exports.filesOnRecord())]
  const kept = await verifyFiles(parts.files, onRecord)
  for (const { at, what, detail } of [...animals.faults, ...orders.faults])
    process.stderr.write(`${at}: ${what} differ: ${detail}\n`)
  for (const { at, what, detail } of [...cases.faults, ...overrides.faults, ...rows.faults, ...kept.faults])
    process.stderr.write(`${at}: ${what}: ${detail}\n`)
  if (chain.brokenAt)
    process.stderr.write(
      `audit trail: broken at entry ${String(chain.brokenAt.seq)} (npm run audit:verify says how)\n`,
    )
  const found = [animals, orders, cases, overrides, rows, kept].reduce(
    (sum, { faults }) => sum + faults.length,
    0,
  )
  const faults = found + (chain.brokenAt ? 1 : 0)
  process.stdout.write(
    `${String(animals.animals)} animals and groups, ${String(animals.entries)} count lines, ` +
      `${String(animals.moves)} moves, ${String(orders.versions)} signed orders, ` +
      `${String(cases.signatures)} signatures under cases, ${String(rows.rows)} rows, ${String(kept.files)} files: ` +
      `${faults === 0 ? 'all agree' : `${String(faults)} faults`}\n`,
  )
  return faults === 0 ? 0 : 1
})
