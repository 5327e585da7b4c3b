import { FileCheck2, ScrollText, TriangleAlert } from 'lucide-react'
import { Link } from 'react-router-dom'
import { historyWords as words } from '../../../shared/messages/history.ts'
import { permitKindNames, permitMarkNames } from '../../../shared/messages/register-kinds.ts'
import { paths } from '../../lib/paths.ts'
import { Icon } from '../../ui/icon.tsx'
import { Tag } from '../../ui/tag.tsx'
import { paperAddress } from '../documents/index.ts'
import type { Port } from './ports.ts'

/** Custody as a passage through ports, the newest at the top: date, mark, what happened, the papers that prove it. */
export function PortList({ ports }: { ports: readonly Port[] }) {
  return (
    <ol className="ports">
      {ports.map((port) => (
        <li key={port.key} className={`port port-${port.state}`}>
          <span className="port-when">{port.when}</span>
          <PortMark state={port.state} />
          <div>
            <h3 className="port-title">
              {port.title} {port.state === 'struck' ? <Tag>{words.struckTag}</Tag> : null}
            </h3>
            {port.details.length > 0 ? <p className="port-details">{port.details.join(' ')}</p> : null}
          </div>
          <PortPapers port={port} />
        </li>
      ))}
    </ol>
  )
}

/** Filled where the custody has been, open where it is now, crossed where it was entered wrongly. */
function PortMark({ state }: { state: Port['state'] }) {
  return (
    <span className="port-mark" aria-hidden="true">
      <svg width="24" height="24">
        {state === 'now' ? <circle cx="12" cy="12" r="5" className="p-due" /> : null}
        {state === 'made' ? (
          <>
            <circle cx="12" cy="12" r="6" className="p-done" />
            <circle cx="12" cy="12" r="1.7" className="p-dot" />
          </>
        ) : null}
        {state === 'struck' ? <path d="M7 7l10 10M17 7L7 17" className="p-failed" /> : null}
      </svg>
    </span>
  )
}

function PortPapers({ port }: { port: Port }) {
  const papers = port.papers.filter((paper) => paper.voided === null)
  if (port.transaction === null) return <div className="port-papers" />
  return (
    <div className="port-papers">
      {papers.map((paper) => (
        <a key={paper.id} href={paperAddress(paper.id)} download={paper.fileName}>
          <Icon of={FileCheck2} />
          <span>{paper.title}</span>
        </a>
      ))}
      {port.permits.map((permit) => (
        <span key={permit.number}>
          <Link to={paths.permit(permit.number)}>
            <Icon of={permit.marks.length > 0 ? TriangleAlert : ScrollText} />
            <span>
              {permitKindNames[permit.kind]} {permit.permitNumber}
            </span>
          </Link>
          {permit.marks.length > 0 ? (
            <span className="t-note block">
              {permit.marks.map((mark) => permitMarkNames[mark]).join(', ')}
            </span>
          ) : null}
        </span>
      ))}
      {papers.length === 0 && port.permits.length === 0 ? (
        <span className="t-note">{words.noPaper}</span>
      ) : null}
      <Link className="t-note" to={paths.transaction(port.transaction)}>
        {port.transaction}
      </Link>
    </div>
  )
}
