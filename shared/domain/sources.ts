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

  'cfr-529-1030': { citation: '21 CFR 529.1030, formalin; read in the 2015 edition', mark: 'V' },
  'cfr-529-1150': { citation: '21 CFR 529.1150, hydrogen peroxide; read in the 2015 edition', mark: 'V' },
  'cfr-529-382': { citation: '21 CFR 529.382, chloramine-T; read current to April 2026', mark: 'V' },
  'cfr-529-2503': {
    citation: '21 CFR 529.2503, tricaine methanesulfonate; read in the 2015 edition',
    mark: 'V',
  },
  'ufifas-vm77': { citation: 'UF/IFAS Extension VM-77, Francis-Floyd and Pouder: formalin', mark: 'V' },
  'ufifas-vm86': { citation: 'UF/IFAS Extension VM-86, Francis-Floyd: salt', mark: 'V' },
  'ufifas-fa008': {
    citation: 'UF/IFAS Extension FA008, Watson and Yanong: copper in fresh water',
    mark: 'V',
  },
  'ufifas-fa165': {
    citation: 'UF/IFAS Extension FA165, Yanong: copper in marine systems; figures as restated elsewhere',
    mark: 'V2',
  },
  'ufifas-fa157': {
    citation: 'UF/IFAS Extension FA157, Yanong: hydrogen peroxide; marine figure',
    mark: 'M',
  },
  'thomas-2016': {
    citation: 'Thomas, Dawson, Ellis and Stamper 2016, PeerJ 4:e1857: praziquantel',
    mark: 'V',
  },
  'forwood-2013': {
    citation: 'Forwood et al. 2013, Journal of Fish Diseases, doi 10.1111/jfd.12089',
    mark: 'V',
  },
  'noga-2010': {
    citation: 'Noga 2010, Fish Disease: Diagnosis and Treatment, 2nd edition, as quoted',
    mark: 'V2',
  },

  'ufifas-fa37': {
    citation:
      'UF/IFAS Extension FA37, Francis-Floyd and Klinger: potassium permanganate, as restated elsewhere',
    mark: 'V2',
  },
  'extension-sheets': {
    citation: 'University extension sheets on baths: a wrong volume is a wrong dose',
    mark: 'V',
  },
  'hyatt-2017': {
    citation: 'Hyatt et al. 2017, Journal of Zoo and Wildlife Medicine 48(2): a drug that accumulated',
    mark: 'V',
  },
  'treatment-practice': { citation: 'Common practice of aquatic medicine, from memory', mark: 'M' },
  'formalin-density': {
    citation:
      'Density of 37 % formaldehyde solution, 1.08 g/mL, from memory; the lot’s own where it is known',
    mark: 'M',
  },
  'dose-arithmetic': {
    citation:
      'Computed: one figure on two bases differs by factors of 0.25 (copper), 0.37 (formalin), 0.62 (chloroquine)',
    mark: 'C',
  },

  'quarantine-practice': {
    citation:
      'Public quarantine standard of an accreditation body: at least 30 days under veterinary supervision; further ' +
      'animals of the same kind entering the area start the period again',
    mark: 'V',
  },
} as const satisfies Record<string, Source>

export type SourceKey = keyof typeof sources
