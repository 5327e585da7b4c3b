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

  'nist-sp-811': {
    citation:
      'NIST Special Publication 811 and Handbook 44 appendix C: inch, pound and US gallon by exact definition; ' +
      'factors derived again from 1 in = 2.54 cm, 1 lb = 0.45359237 kg, 1 US gal = 231 cubic inches',
    mark: 'C',
  },
  'iupac-weights': { citation: 'IUPAC abridged standard atomic weights', mark: 'C' },
  'jcgm-100': {
    citation:
      'JCGM 100, Evaluation of measurement data: Guide to the expression of uncertainty in measurement, 5.1',
    mark: 'M',
  },
  'ismp-dose-designations': {
    citation:
      'Institute for Safe Medication Practices, list of error-prone abbreviations, symbols and dose designations',
    mark: 'V2',
  },
  'joint-commission-do-not-use': { citation: 'Joint Commission, official “do not use” list', mark: 'V2' },
} as const satisfies Record<string, Source>

export type SourceKey = keyof typeof sources
