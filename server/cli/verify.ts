import { verifyAnimals } from '../features/animals/index.ts'
import { verifyOrders } from '../features/orders/index.ts'
import { verifyFiles } from '../platform/files/verify-files.ts'
import { withComposition } from './connect.ts'

// npm run verify: works out what is derived (stays, counts) from the ledgers again, checks what is stored beside signed
// orders against what was signed, reads every kept file again, and says where they differ
await withComposition(async ({ parts, signing, documents, exports }) => {
  const animals = await verifyAnimals(parts.dataSource)
  const orders = await verifyOrders(parts.dataSource, signing.service.signer)
  const onRecord = [...(await documents.filesOnRecord()), ...(await exports.filesOnRecord())]
  const kept = await verifyFiles(parts.files, onRecord)
  for (const { at, what, detail } of [...animals.faults, ...orders.faults])
    process.stderr.write(`${at}: ${what} differ: ${detail}\n`)
  for (const fault of kept.faults) process.stderr.write(`${fault.at}: ${fault.what}: ${fault.detail}\n`)
  const faults = animals.faults.length + orders.faults.length + kept.faults.length
  process.stdout.write(
    `${String(animals.animals)} animals and groups, ${String(animals.entries)} count lines, ` +
      `${String(animals.moves)} moves, ${String(orders.versions)} signed orders, ${String(kept.files)} files: ` +
      `${faults === 0 ? 'all agree' : `${String(faults)} faults`}\n`,
  )
  return faults === 0 ? 0 : 1
})
