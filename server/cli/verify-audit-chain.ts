import { verifyChain } from '../platform/audit/verify-chain.ts'
import { withComposition } from './connect.ts'

const why = {
  gap: 'an entry is missing before it',
  link: 'it does not follow the entry before it',
  hash: 'its text was changed',
  projection: 'its columns no longer say what its text says',
} as const

// npm run audit:verify: walks the whole audit chain and says where it breaks, if it does
await withComposition(async ({ parts }) => {
  const report = await verifyChain(parts.dataSource)
  if (report.brokenAt) {
    process.stderr.write(
      `The audit chain breaks at entry ${String(report.brokenAt.seq)}: ${why[report.brokenAt.why]}.\n`,
    )
    return 1
  }
  process.stdout.write(
    `The audit chain holds: ${String(report.entries)} entries, last hash ${report.lastHash}\n`,
  )
  return 0
})
