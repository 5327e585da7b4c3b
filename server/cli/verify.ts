import { verifyAnimals } from '../features/animals/index.ts'
import { withComposition } from './connect.ts'

// npm run verify: works out what is derived (stays, counts) from the ledgers again, and says where it differs
await withComposition(async ({ parts }) => {
  const report = await verifyAnimals(parts.dataSource)
  for (const fault of report.faults)
    process.stderr.write(`${fault.at}: ${fault.what} differ: ${fault.detail}\n`)
  process.stdout.write(
    `${String(report.animals)} animals and groups, ${String(report.entries)} count lines, ` +
      `${String(report.moves)} moves: ${report.faults.length === 0 ? 'all agree' : `${String(report.faults.length)} faults`}\n`,
  )
  return report.faults.length === 0 ? 0 : 1
})
