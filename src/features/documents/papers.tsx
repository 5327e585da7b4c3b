import { useState } from 'react'
import { FileCheck2, FileX2, Paperclip } from 'lucide-react'
import type { AttachedDocument } from '../../../shared/contracts/documents.contract.ts'
import { paperWords as words } from '../../../shared/messages/documents-sheet.ts'
import { documentKindNames } from '../../../shared/messages/register-kinds.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { sayBytes } from '../../lib/say-bytes.ts'
import { Button } from '../../ui/button.tsx'
import { Icon } from '../../ui/icon.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { AttachDialog } from './attach-dialog.tsx'
import type { AttachTarget } from './attach-dialog.tsx'
import { useVoidPaper } from './mutations.ts'
import { paperAddress } from './queries.ts'

/** The papers of a record: each a link to its bytes, voided ones marked; with the right to it, more can be attached. */
export function Papers({
  papers,
  target,
  mayAttach = false,
}: {
  papers: readonly AttachedDocument[]
  /** Where more are attached; not needed where they are only read. */
  target?: AttachTarget
  mayAttach?: boolean
}) {
  const [attaching, setAttaching] = useState(false)
  const [voiding, setVoiding] = useState<{ paper: AttachedDocument; key: string } | null>(null)
  const voidPaper = useVoidPaper(target?.readAgain ?? [])
  return (
    <div className="stack">
      {papers.length === 0 ? <p className="t-2">{words.none}</p> : null}
      <ul className="stack">
        {papers.map((paper) => (
          <PaperLine
            key={paper.id}
            paper={paper}
            onVoid={mayAttach ? () => setVoiding({ paper, key: newId() }) : undefined}
          />
        ))}
      </ul>
      {mayAttach ? (
        <div>
          <Button icon={Paperclip} onClick={() => setAttaching(true)}>
            {words.attach}
          </Button>
        </div>
      ) : null}
      {attaching && target ? <AttachDialog target={target} onBack={() => setAttaching(false)} /> : null}
      {voiding ? (
        <ReasonDialog
          question={words.voidQuestion({ title: voiding.paper.title })}
          body={words.voidBody}
          label={words.voidReason}
          act={words.voidAct}
          back={words.voidBack}
          onBack={() => setVoiding(null)}
          onAct={async (reason) => {
            await voidPaper.mutateAsync({ id: voiding.paper.id, reason, key: voiding.key })
            setVoiding(null)
          }}
        />
      ) : null}
    </div>
  )
}

function PaperLine({ paper, onVoid }: { paper: AttachedDocument; onVoid: (() => void) | undefined }) {
  const { zone } = useMe().facility
  return (
    <li className="paper-line">
      <Icon of={paper.voided ? FileX2 : FileCheck2} />
      <div>
        <a href={paperAddress(paper.id)} download={paper.fileName} className={paper.voided ? 'struck' : ''}>
          {paper.title}
        </a>
        <p className="t-note">
          {words.line({
            kind: documentKindNames[paper.kind],
            size: sayBytes(paper.bytes),
            by: paper.attachedBy,
            at: sayInstant(paper.attachedAt, zone),
          })}
        </p>
        {paper.voided ? <p className="t-note">{words.voided(paper.voided)}</p> : null}
      </div>
      {onVoid && !paper.voided ? (
        <Button kind="plain" size="small" aria-label={words.void({ title: paper.title })} onClick={onVoid}>
          {words.voidShort}
        </Button>
      ) : null}
    </li>
  )
}
