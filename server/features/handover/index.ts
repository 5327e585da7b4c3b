import type { HandoverNote } from '../../../shared/contracts/handover.contract.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import { HandoverNoteRow, HandoverReadRow } from './handover.entity.ts'
import { readNotes } from './handover.reads.ts'
import type { HandoverReadRow as NoteReadRow } from './handover.reads.ts'
import { handoverRoutes } from './handover.routes.ts'
import { createHandoverService } from './handover.service.ts'

export const handoverEntities = [HandoverNoteRow, HandoverReadRow]

function presentNote(row: NoteReadRow, personId: string | null): HandoverNote {
  return {
    id: row.id,
    about: row.about,
    words: row.words,
    at: row.recorded_at.toISOString(),
    by: row.by_name,
    readBy: row.reads.map(({ by, at }) => ({ by, at: new Date(at).toISOString() })),
    mine: row.recorded_by === personId,
    readByMe: row.reads.some((read) => read.personId === personId),
  }
}

/** Notes from one watch to the next, with who has read them. */
export function createHandover(parts: Parts) {
  const service = createHandoverService(parts)
  return {
    service,
    /** Notes written since an instant, the newest first, as one person sees them. */
    notesSince: async (since: Date, personId: string | null) =>
      (await readNotes(parts.dataSource, { since })).map((row) => presentNote(row, personId)),
    routes: handoverRoutes(service, {
      async note(id, personId) {
        const [row] = await readNotes(parts.dataSource, { id })
        if (!row) throw new Problem('not-found')
        return presentNote(row, personId)
      },
    }),
  }
}

export type Handover = ReturnType<typeof createHandover>
