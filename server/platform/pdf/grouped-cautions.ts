import { groupSaid } from '../../../shared/domain/cautions/group-said.ts'
import type { SaidWithCause } from '../../../shared/domain/cautions/group-said.ts'
import type { CautionBlock, Span } from '../../../shared/domain/documents/pdf-document-model.ts'
import { partWords } from '../../../shared/messages/parts.ts'

interface PrintedCaution extends SaidWithCause {
  ruleId: string
  title: string
  text: string
}

/** An edge is not divided between pages: with more in it, a long list would leave most of a page empty. */
export const mostInOneEdge = 3

/**
 * Several cautions of one cause, each a line with its level, rule and words, and who overrode it and why.
 *
 * @param members the gravest first
 */
export function oneCauseBlocks<C extends PrintedCaution>(
  members: readonly C[],
  overriddenBy: (caution: C) => readonly Span[] | undefined,
): CautionBlock[] {
  const blocks: CautionBlock[] = []
  for (let i = 0; i < members.length; i += mostInOneEdge) {
    const part = members.slice(i, i + mostInOneEdge)
    const [first] = part
    const [lead] = members
    if (!first || !lead) continue
    blocks.push({
      kind: 'caution',
      level: first.level,
      title: partWords.oneCause({ title: lead.title, count: members.length }),
      lines: part.map((one) => {
        const { level, ruleId, title, text } = one
        const override = overriddenBy(one) ?? []
        return [
          { text: partWords.cautionOf({ level: partWords[level], rule: ruleId, title }), bold: true },
          { text: ` ${text}` },
          ...(override.length > 0 ? [{ text: ' ' }, ...override] : []),
        ]
      }),
    })
  }
  return blocks
}

/** Cautions on paper, those of one cause together; one alone is drawn as `alone` draws it. */
export function groupedCautions<C extends PrintedCaution>(
  cautions: readonly C[],
  given: { alone(caution: C): CautionBlock; overriddenBy(caution: C): readonly Span[] | undefined },
): CautionBlock[] {
  return groupSaid(cautions).flatMap(({ lead, members }) =>
    members.length === 1 ? [given.alone(lead)] : oneCauseBlocks(members, given.overriddenBy),
  )
}
