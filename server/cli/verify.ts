import { verifyAnimals } from '../features/animals/index.ts'
import { verifyFiles } from '../platform/files/verify-files.ts'
import { withComposition } from './connect.ts'

// npm run verify: works out what is derived (stays, counts) from the ledgers again, reads every kept file again, and says
// where the two differ
await withComposition(async ({ parts, documents, exports }) => {
  const animals = await verifyAnimals(parts.dataSource)
  const onRecord = [...(await documents.filesOnRecord()), ...(await exports.filesOnRecord())]
  const kept = await verifyFiles(parts.files, onRecord)
  for (const fault of animals.faults)
    process.stderr.write(`${fault.at}: ${fault.what} differ: ${fault.detail}\n`)
  for (const fault of kept.faults) process.stderr.write(`${fault.at}: ${fault.what}: ${fault.detail}\n`)
  const faults = animals.faults.length + kept.faults.length
  process.stdout.write(
    `${String(animals.animals)} animals and groups, ${String(animals.entries)} count lines, ` +
      `${String(animals.moves)} moves, ${String(kept.files)} files: ` +
      `${faults === 0 ? 'all agree' : `${String(faults)} faults`}\n`,
  )
  return faults === 0 ? 0 : 1
})
