import { documentKinds } from '../../../shared/domain/register/document-kinds.ts'
import { paperWords as words } from '../../../shared/messages/documents-sheet.ts'
import { documentKindNames } from '../../../shared/messages/register-kinds.ts'
import { FileField } from '../../ui/file-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import type { PaperGiven } from './mutations.ts'

const kept =
  '.pdf,.png,.jpg,.jpeg,.webp,.csv,.txt,application/pdf,image/png,image/jpeg,image/webp,text/csv,text/plain'

export type PaperFaults = Partial<Record<'title' | 'kind' | 'file', string>>

/** What is missing of a paper before it can be sent. */
export function paperFaults(paper: PaperGiven): PaperFaults {
  return {
    ...(paper.title.trim() === '' ? { title: words.needed } : {}),
    ...(paper.kind === '' ? { kind: words.needed } : {}),
    ...(paper.file === null ? { file: words.fileNeeded } : {}),
  }
}

/** The fields of one paper. A chosen file gives the title its name, until somebody types one. */
export function PaperFields({
  paper,
  faults,
  onChange,
}: {
  paper: PaperGiven
  faults: PaperFaults
  onChange: (next: PaperGiven) => void
}) {
  return (
    <div className="stack">
      <FileField
        label={words.file}
        hint={paper.file ? paper.file.name : words.fileHint}
        wrong={faults.file}
        accept={kept}
        onFile={(file) =>
          onChange({
            ...paper,
            file,
            title: paper.title === '' && file ? file.name.replace(/\.\w+$/, '') : paper.title,
          })
        }
      />
      <TextField
        label={words.title}
        value={paper.title}
        wrong={faults.title}
        maxLength={200}
        onChange={(event) => onChange({ ...paper, title: event.target.value })}
      />
      <SelectField
        label={words.kind}
        value={paper.kind}
        wrong={faults.kind}
        options={documentKinds.map((kind) => ({ value: kind, label: documentKindNames[kind] }))}
        onChange={(event) => onChange({ ...paper, kind: event.target.value })}
      />
    </div>
  )
}
