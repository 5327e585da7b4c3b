/**
 * Every work that a figure in this project rests on, cited once. Engines and formulary lines name a key.
 *
 * Marks: V the source itself was opened · V2 a page restating it was opened · C computed from stated inputs ·
 * M from memory, confirm before relying on it · P a project default with no outside authority.
 */
export type SourceMark = 'V' | 'V2' | 'C' | 'M' | 'P'

export interface Source {
  citation: string
  mark: SourceMark
}

export const sources = {
  'project-default': { citation: 'Project default, to be confirmed by the facility', mark: 'P' },
} as const satisfies Record<string, Source>

export type SourceKey = keyof typeof sources
