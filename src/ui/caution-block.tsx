import type { ReactNode } from 'react'
import { Check, Info, OctagonX, TriangleAlert } from 'lucide-react'
import type { LucideIcon } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { Icon } from './icon.tsx'

export type CautionLevel = 'note' | 'warning' | 'stop'

const icons: Record<CautionLevel, LucideIcon> = { note: Info, warning: TriangleAlert, stop: OctagonX }

export interface CautionBlockProps {
  level: CautionLevel
  title?: ReactNode
  children: ReactNode
  /** Where the rule comes from, with its mark. */
  source?: ReactNode
  /** Who read it or overrode it, when and why: "Overridden by Dr I. Marrow 14:12, reason: …". */
  answer?: ReactNode
  /** The form in which a veterinarian overrides this stop. Never given for a stop that can't be overridden. */
  override?: ReactNode
  /** The rules mark this stop so; it says so and offers no field. */
  cannotOverride?: boolean
}

/**
 * A fired safety rule. An overridden stop keeps its look; a stop never folds away. Edge, ground, drawing and word tell
 * the levels apart without colour.
 */
export function CautionBlock(props: CautionBlockProps) {
  const { level, title, children, source, answer, override, cannotOverride } = props
  return (
    <div className={`caution caution-${level}`}>
      <span className="caution-level">
        <Icon of={icons[level]} size={20} />
        {partWords[level]}
      </span>
      <div className="caution-body">
        {title ? <strong className="caution-title">{title}</strong> : null}
        <p>{children}</p>
        {source ? <div className="caution-source">{source}</div> : null}
        {cannotOverride ? <p>{partWords.cannotBeOverridden}</p> : null}
        {answer ? (
          <div className="caution-answer">
            <Icon of={Check} />
            <span>{answer}</span>
          </div>
        ) : null}
        {override && !cannotOverride ? <div className="caution-override">{override}</div> : null}
      </div>
    </div>
  )
}

/** One caution among those of one cause: as a block of its own has it, with its rule and a key. */
export interface CautionMember extends CautionBlockProps {
  key: string
  ruleId: string
}

/**
 * Cautions of one cause in one block, the gravest first. Each keeps its level, rule, words, answer and override of its own:
 * nothing folds away, and no stop stands under a lesser word.
 *
 * @param acknowledge the one tick that answers every warning among them
 */
export function CautionGroupBlock({
  members,
  acknowledge,
}: {
  members: readonly CautionMember[]
  acknowledge?: ReactNode
}) {
  const [lead] = members
  if (!lead) return null
  if (members.length === 1) {
    const { key: _key, ruleId: _ruleId, ...alone } = lead
    return <CautionBlock {...alone} override={alone.override ?? acknowledge} />
  }
  return (
    <div className={`caution caution-${lead.level}`}>
      <span className="caution-level">
        <Icon of={icons[lead.level]} size={20} />
        {partWords[lead.level]}
      </span>
      <div className="caution-body">
        <strong className="caution-title">
          {partWords.oneCause({ title: String(lead.title), count: members.length })}
        </strong>
        <ul className="caution-members">
          {members.map((one) => (
            <li key={one.key}>
              <p>
                <b>
                  {partWords.cautionOf({
                    level: partWords[one.level],
                    rule: one.ruleId,
                    title: String(one.title),
                  })}
                </b>{' '}
                {one.children}
              </p>
              {one.source ? <div className="caution-source">{one.source}</div> : null}
              {one.cannotOverride ? <p>{partWords.cannotBeOverridden}</p> : null}
              {one.answer ? (
                <div className="caution-answer">
                  <Icon of={Check} />
                  <span>{one.answer}</span>
                </div>
              ) : null}
              {one.override && !one.cannotOverride ? (
                <div className="caution-override">{one.override}</div>
              ) : null}
            </li>
          ))}
        </ul>
        {acknowledge ? <div className="caution-override">{acknowledge}</div> : null}
      </div>
    </div>
  )
}

const order: Record<CautionLevel, number> = { stop: 0, warning: 1, note: 2 }

/** Stops first, then warnings, then notes; otherwise as they came. */
export function sortCautions<T extends { level: CautionLevel }>(cautions: readonly T[]): T[] {
  return [...cautions].sort((a, b) => order[a.level] - order[b.level])
}
