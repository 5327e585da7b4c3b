import type { DoseLine } from '../../../shared/contracts/formulary.contract.ts'
import { lineStateNames } from '../../../shared/messages/formulary-screens.ts'
import { Tag } from '../../ui/tag.tsx'

/** How a dose line stands, in words. */
export function LineState({ state }: { state: DoseLine['state'] }) {
  return <Tag kind={state === 'confirmed' ? 'done' : 'plain'}>{lineStateNames[state]}</Tag>
}
