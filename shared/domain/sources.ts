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

  'us-controlled-schedules': {
    citation:
      'United States schedules of controlled substances: butorphanol in schedule IV, ketamine in schedule III',
    mark: 'M',
  },

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
  'cfr-1910-1048': {
    citation: '29 CFR 1910.1048, formaldehyde at work; read in the text of November 2024',
    mark: 'V',
  },
  'govett-2009': { citation: 'Govett et al. 2009: ceftazidime in koi', mark: 'V' },
  'fredholm-2016': { citation: 'Fredholm et al. 2016: meloxicam in Nile tilapia', mark: 'V' },
  'greene-2020': { citation: 'Greene et al. 2020: ketoprofen in trout and tilapia', mark: 'V' },
  'exotic-formulary': { citation: 'A formulary of exotic animals (Carpenter), from memory', mark: 'M' },
  'harms-2005': { citation: 'Harms et al. 2005: butorphanol in fish, from memory', mark: 'M' },
  'bunting-2009': {
    citation: 'Bunting et al. 2009, Journal of Zoo and Wildlife Medicine 40(3): itraconazole in penguins',
    mark: 'V',
  },
  'cfr-530-3': {
    citation: '21 CFR 530.3(i)(3), follow-up of an adverse reaction; read in the text of March 2024',
    mark: 'V',
  },
  'cfr-530-41': {
    citation: '21 CFR 530.41, drugs prohibited for extralabel use in food animals; read in the 2015 edition',
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

  'unesco-44': {
    citation:
      'Fofonoff and Millard 1983, Algorithms for computation of fundamental properties of seawater, UNESCO Technical ' +
      'Papers in Marine Science 44: PSS-78 (Perkin and Lewis 1980), EOS-80 at one atmosphere (Millero and Poisson 1981), ' +
      'freezing point',
    mark: 'V',
  },
  'hill-1986': {
    citation:
      'Hill, Dauphinee and Woods 1986, extension of PSS-78 to low salinities; formula as in two public implementations',
    mark: 'V2',
  },
  'teos-10': {
    citation:
      'IOC, SCOR and IAPSO 2010, TEOS-10 manual: reference salinity is 35.16504/35 of the practical one',
    mark: 'C',
  },
  'fish-freezing': {
    citation:
      'General physiology, from memory: the blood of most bony fish freezes near −0.7 °C unless they carry antifreeze',
    mark: 'M',
  },
  'benson-krause-1984': {
    citation:
      'Benson and Krause 1984, Limnology and Oceanography 29, 620–632, as in US Geological Survey memorandum 2011.03 ' +
      'and APHA Standard Methods 4500-O; coefficients from concordant secondary copies',
    mark: 'V2',
  },
  'benson-krause-vapour': {
    citation: 'Benson and Krause 1984: vapour pressure of water in the pressure factor, from memory',
    mark: 'M',
  },
  'garcia-gordon-1992': {
    citation:
      'Garcia and Gordon 1992, Limnology and Oceanography 37, 1307–1312, eq. 8; coefficients from secondary copies',
    mark: 'V2',
  },
  'gas-supersaturation': {
    citation:
      'Common practice of aquatic medicine, from memory: above 110 % of saturation gas bubble disease is looked for',
    mark: 'M',
  },
  'conductivity-meters': {
    citation:
      'Common practice, from memory: conductivity meters compensate linearly, near 2 % per °C, to 25 °C or to 20 °C',
    mark: 'M',
  },
  'standard-atmosphere': {
    citation: 'ICAO and US Standard Atmosphere 1976, formula of the troposphere',
    mark: 'C',
  },
  'emerson-1975': {
    citation:
      'Emerson, Russo, Lund and Thurston 1975, Journal of the Fisheries Research Board of Canada 32, 2379–2383; ' +
      'coefficients and table from concordant secondary copies',
    mark: 'V2',
  },
  'clegg-whitfield-1995': {
    citation:
      'Clegg and Whitfield 1995, Geochimica et Cosmochimica Acta 59, 2403–2421; abstract opened, coefficients from two ' +
      'unrelated public model codes',
    mark: 'V2',
  },
  'ph-scale-rule': {
    citation:
      'Project rule: a pH from NBS buffers is used with the free-scale constant; within 4.2 % of the table of Bower and ' +
      'Bidwell 1978, an electrode adds about 0.05 pH of its own',
    mark: 'P',
  },
  'srac-410': {
    citation:
      'Masser and Jensen 1991, Calculating Treatments for Ponds and Tanks, SRAC Publication 410; tables from memory',
    mark: 'M',
  },
  'piper-1982': {
    citation: 'Piper et al. 1982, Fish Hatchery Management, US Fish and Wildlife Service, p. 276 and 283',
    mark: 'V',
  },
  mensuration: { citation: 'Mensuration: closed forms, checked by numerical integration', mark: 'C' },
  'stirred-tank': {
    citation: 'Mass balance of a well-mixed tank, checked against an ODE solver',
    mark: 'C',
  },
  'salt-balance': { citation: 'Balance of salt and water; density is left out where it is said', mark: 'C' },
  'salinity-practice': {
    citation:
      'Common practice, no source: salinity is lowered by at most 4 to 5 a day and raised by 1 to 3 a day',
    mark: 'M',
  },
  'mcnevin-2003': {
    citation:
      'McNevin 2003, MS thesis, Auburn University: copper sulfate at a hundredth of the total alkalinity',
    mark: 'V',
  },
  'copper-alkalinity-limits': {
    citation:
      'Extension text: no copper sulfate below 50 mg/L alkalinity; the cap at 250 mg/L is common practice, no source',
    mark: 'M',
  },
  'feed-arithmetic': {
    citation:
      'Worked examples of a fish farmers’ association (75 mg/kg) and of a livestock health site (premix); arithmetic recomputed',
    mark: 'V2',
  },
  'cfr-558-261': { citation: '21 CFR 558.261, feed levels of florfenicol, from memory', mark: 'M' },
  'injection-practice': {
    citation: 'Common practice, no source: at least 20 graduations, and a rounding error of at most 5 %',
    mark: 'M',
  },
  'le-cren-1951': {
    citation: 'Le Cren 1951, Journal of Animal Ecology 20, 201–219: relative condition',
    mark: 'M',
  },
  'froese-2006': {
    citation: 'Froese 2006, Journal of Applied Ichthyology 22, 241–253: exponents of 2.5 to 3.5 are typical',
    mark: 'M',
  },
  'thiosulfate-stoichiometry': {
    citation:
      'Computed from atomic weights: thiosulfate and chlorine to tetrathionate, 7.00 mg of the pentahydrate per mg',
    mark: 'C',
  },
  'thiosulfate-support-note': {
    citation:
      'Support note of a maker of water tests: 7.0 mg of thiosulfate pentahydrate for a milligram of chlorine',
    mark: 'V2',
  },
  'dechlorination-practice': {
    citation: 'Common practice, no source: ten times the chlorine for incoming tap water',
    mark: 'M',
  },
  'tricaine-ph-study': {
    citation:
      'North American Journal of Aquaculture 75:356–360 (2013): pH of tricaine in fresh and artificial sea water',
    mark: 'V',
  },
  'tricaine-buffer-practice': {
    citation:
      'Common practice, no source: two parts of bicarbonate to one of tricaine; less in hard or salt water, by the measured pH',
    mark: 'M',
  },
  'mass-balance': {
    citation: 'Balance of mass: what is put in is what is there; computed',
    mark: 'C',
  },
  'bleach-practice': {
    citation:
      'Common practice, no source: bleach weakens with age, dirt uses chlorine up, and acid, ammonia and formalin are kept away from it',
    mark: 'M',
  },
  'ozone-practice': {
    citation:
      'Common practice, no source: ozone in sea water makes bromine and bromate, so total residual oxidants are measured',
    mark: 'M',
  },
  'allometric-scaling': {
    citation:
      'Allometric scaling of a dose by body mass to the power of 0.75, for information only, from memory',
    mark: 'M',
  },
  'epa-contact-time': {
    citation: 'US EPA disinfection profiling guidance, baffling factors, from memory',
    mark: 'M',
  },
  'quarantine-practice': {
    citation:
      'Public quarantine standard of an accreditation body: at least 30 days under veterinary supervision; further ' +
      'animals of the same kind entering the area start the period again',
    mark: 'V',
  },
} as const satisfies Record<string, Source>

export type SourceKey = keyof typeof sources
