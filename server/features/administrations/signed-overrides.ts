import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import { factsOfRule } from '../../../shared/domain/cautions/facts-of-rule.ts'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import type { Caution } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { hashOf } from '../../platform/database/transactions.ts'
import type { Db } from '../../platform/database/db.ts'
import { withFault } from '../signing/index.ts'
import type { SigningService } from '../signing/index.ts'
import { readAllOverrides, readLooseOverrideTexts, readOverrides } from './overrides.reads.ts'
import type { OverrideReadRow } from './overrides.reads.ts'

/** What a signature under an override at a dose covers. */
export interface OverrideContent {
  kind: 'dose-override'
  overrideId: string
  order: { number: string; versionNo: number; hash: string }
  doseKey: string
  ruleId: string
  code: string
  title: string
  text: string
  /** Names rule, code, lot and facts in one. */
  finding: string
  lotId: string | null
  facts: Json
  reason: string
}

/** An override at a dose, read back and checked now. */
export interface SignedOverride {
  id: string
  content: OverrideContent | null
  block: SignatureBlock
}

/** The facts that a finding rests on, and the name of both together: other facts or another lot are another finding. */
export function findingOf(
  { ruleId, code, settings }: Pick<Caution, 'ruleId' | 'code' | 'settings'>,
  facts: CautionFacts,
  lotId: string | null,
): { finding: string; facts: Json } {
  const used = JSON.parse(JSON.stringify(factsOfRule(facts, ruleId))) as Json
  // another threshold of the facility makes it another finding; the defaults were never part of the name
  const own = settings.filter(({ confirmed }) => confirmed !== null).map(({ key, value }) => ({ key, value }))
  const named = { ruleId, code, lotId, facts: used, ...(own.length === 0 ? {} : { settings: own }) }
  return { finding: hashOf(canonicalJson(named)), facts: used }
}

function fits(row: OverrideReadRow, content: OverrideContent | null): boolean {
  return (
    content?.kind === 'dose-override' &&
    content.overrideId === row.id &&
    content.order.number === row.number &&
    content.doseKey === row.dose_key &&
    content.ruleId === row.rule_id &&
    content.code === row.code &&
    content.reason === row.reason
  )
}

async function readSigned(signing: SigningService, row: OverrideReadRow): Promise<SignedOverride> {
  const { block, content: said } = await signing.readSealed(row.signed_text_id, row.recorded_at)
  const content = said as unknown as OverrideContent | null
  const isSound = fits(row, content)
  return {
    id: row.id,
    content: isSound ? content : null,
    block: block.state === 'intact' && !isSound ? withFault(block, { what: 'whose', entries: [] }) : block,
  }
}

/** Every override that was signed for a dose, in time order, each checked now. */
export async function readSignedOverrides(
  db: Db,
  signing: SigningService,
  dose: { orderVersionId: string; key: string },
): Promise<SignedOverride[]> {
  const rows = await readOverrides(db, dose.orderVersionId, dose.key)
  return Promise.all(rows.map((row) => readSigned(signing, row)))
}

/** Checks every override that was signed at a dose: the text against its seal, and the row against the text. */
export async function verifyOverrides(db: Db, signing: SigningService) {
  const rows = await readAllOverrides(db)
  const faults: { at: string; what: 'signature'; detail: string }[] = []
  for (const row of rows) {
    const { block } = await readSigned(signing, row)
    if (block.state !== 'intact')
      faults.push({
        at: `${row.number} dose ${row.dose_key}`,
        what: 'signature',
        detail: `override ${row.id}: ${block.state}`,
      })
  }
  for (const { label, id } of await readLooseOverrideTexts(db))
    faults.push({ at: label, what: 'signature', detail: `signed text ${id} belongs to no override` })
  return { overrides: rows.length, faults }
}
