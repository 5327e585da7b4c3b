export { TaxonChooser, everyTaxon } from './choose-taxon.tsx'
export { AnimalChooser } from './choose-animal.tsx'
export type { ChooserProps } from './choose-taxon.tsx'
