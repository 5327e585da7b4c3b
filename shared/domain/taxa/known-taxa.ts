import type { SourceMark } from '../sources.ts'
import type { TaxonGroup } from './taxon-group.ts'

/** A taxon that the project knows from the start, with what a grown one may plausibly weigh. */
export interface KnownTaxon {
  scientificName: string
  commonName: string
  group: TaxonGroup
  /** Plausible weight of a grown animal, as digits and a mass unit; null where weight says little (corals, stars). */
  weight: { low: string; high: string; unit: 'g' | 'kg' } | null
  mark: SourceMark
  source: string
}

const memory = 'Plausible adult range, from memory'
/** The range is from memory; one adult weight inside or near it was read. */
const anAge = (kg: string) =>
  `${memory}; one adult weight read in a database of ageing and longevity: ${kg} kg`

const taxon = (
  scientificName: string,
  commonName: string,
  group: TaxonGroup,
  weight: readonly [low: string, high: string, unit: 'g' | 'kg'] | null,
  source: string = memory,
): KnownTaxon => ({
  scientificName,
  commonName,
  group,
  weight: weight && { low: weight[0], high: weight[1], unit: weight[2] },
  mark: 'M',
  source,
})

/**
 * The starting list of taxa, entered by the registrar as needed. The ranges bound what is typed by mistake; they are no
 * clinical reference. Young animals need a band of their own.
 *
 * @source project list; every range carries mark M, single weights that were read are named in `source`
 */
export const knownTaxa: readonly KnownTaxon[] = [
  taxon('Amphiprion ocellaris', 'Clown anemonefish', 'teleost', ['5', '30', 'g']),
  taxon('Paracanthurus hepatus', 'Blue tang', 'teleost', ['20', '600', 'g']),
  taxon('Zebrasoma flavescens', 'Yellow tang', 'teleost', ['20', '400', 'g']),
  taxon('Pterophyllum scalare', 'Freshwater angelfish', 'teleost', ['5', '80', 'g']),
  taxon('Danio rerio', 'Zebrafish', 'teleost', ['0.3', '1.2', 'g']),
  taxon('Carassius auratus', 'Goldfish', 'teleost', ['0.02', '3', 'kg']),
  taxon('Cyprinus carpio', 'Carp', 'teleost', ['0.5', '20', 'kg'], anAge('10.6')),
  taxon('Oncorhynchus mykiss', 'Rainbow trout', 'salmonid', ['0.1', '12', 'kg'], anAge('12.2')),
  taxon('Salvelinus fontinalis', 'Brook trout', 'salmonid', ['0.05', '4', 'kg']),
  taxon('Hippocampus erectus', 'Lined seahorse', 'teleost', ['5', '30', 'g']),
  taxon('Epinephelus itajara', 'Goliath grouper', 'teleost', ['20', '360', 'kg']),
  taxon('Sciaenops ocellatus', 'Red drum', 'teleost', ['1', '25', 'kg'], anAge('24.75')),
  taxon('Tautogolabrus adspersus', 'Cunner', 'teleost', ['0.03', '1', 'kg']),
  taxon('Gadus morhua', 'Atlantic cod', 'teleost', ['0.5', '30', 'kg']),
  taxon('Anarhichas lupus', 'Atlantic wolffish', 'teleost', ['1', '18', 'kg']),
  taxon('Hemitripterus americanus', 'Sea raven', 'teleost', ['0.3', '3.2', 'kg']),
  taxon('Cyclopterus lumpus', 'Lumpfish', 'teleost', ['0.2', '5', 'kg']),
  taxon('Acipenser fulvescens', 'Lake sturgeon', 'sturgeon', ['5', '100', 'kg'], anAge('70')),
  taxon('Pterois volitans', 'Lionfish', 'teleost', ['0.1', '1.2', 'kg']),
  taxon('Carcharias taurus', 'Sand tiger', 'elasmobranch', ['60', '160', 'kg'], anAge('87')),
  taxon('Sphyrna tiburo', 'Bonnethead', 'elasmobranch', ['2', '11', 'kg'], anAge('5.94')),
  taxon('Ginglymostoma cirratum', 'Nurse shark', 'elasmobranch', ['30', '150', 'kg'], anAge('60.3')),
  taxon('Chiloscyllium punctatum', 'Brownbanded bamboo shark', 'elasmobranch', ['1', '5', 'kg']),
  taxon('Stegostoma tigrinum', 'Zebra shark', 'elasmobranch', ['15', '60', 'kg']),
  taxon('Hypanus americanus', 'Southern stingray', 'elasmobranch', ['10', '100', 'kg'], anAge('74.6')),
  taxon('Rhinoptera bonasus', 'Cownose ray', 'elasmobranch', ['8', '23', 'kg']),
  taxon('Spheniscus demersus', 'African penguin', 'bird', ['2.2', '4.5', 'kg'], anAge('3.135')),
  taxon('Spheniscus humboldti', 'Humboldt penguin', 'bird', ['3.3', '6.0', 'kg'], anAge('4.379')),
  taxon('Aptenodytes patagonicus', 'King penguin', 'bird', ['9', '18', 'kg'], anAge('13.0')),
  taxon('Pygoscelis papua', 'Gentoo penguin', 'bird', ['4.5', '8.5', 'kg'], anAge('5.95')),
  taxon('Haematopus palliatus', 'American oystercatcher', 'bird', ['0.4', '0.75', 'kg']),
  taxon('Somateria mollissima', 'Common eider', 'bird', ['1.2', '2.8', 'kg']),
  taxon('Caretta caretta', 'Loggerhead', 'reptile', ['70', '180', 'kg'], anAge('156.5')),
  taxon('Chelonia mydas', 'Green turtle', 'reptile', ['80', '200', 'kg'], anAge('160')),
  taxon('Lepidochelys kempii', 'Kemp’s ridley', 'reptile', ['25', '50', 'kg'], anAge('40.5')),
  taxon('Malaclemys terrapin', 'Diamondback terrapin', 'reptile', ['0.2', '1.5', 'kg'], anAge('0.72')),
  taxon('Xenopus laevis', 'African clawed frog', 'amphibian', ['20', '200', 'g'], anAge('0.13')),
  taxon('Ambystoma mexicanum', 'Axolotl', 'amphibian', ['60', '300', 'g']),
  taxon('Dendrobates tinctorius', 'Dyeing poison frog', 'amphibian', ['2', '8', 'g']),
  taxon('Cryptobranchus alleganiensis', 'Hellbender', 'amphibian', ['0.3', '1.2', 'kg'], anAge('0.358')),
  taxon('Enteroctopus dofleini', 'Giant Pacific octopus', 'cephalopod', ['3', '50', 'kg']),
  taxon('Aurelia aurita', 'Moon jelly', 'jelly', ['5', '500', 'g']),
  taxon('Chrysaora quinquecirrha', 'Sea nettle', 'jelly', null),
  taxon('Homarus americanus', 'American lobster', 'crustacean', ['0.4', '10', 'kg']),
  taxon('Pagurus acadianus', 'Acadian hermit crab', 'crustacean', null),
  taxon('Limulus polyphemus', 'Horseshoe crab', 'other-invertebrate', ['0.5', '4.5', 'kg']),
  taxon('Littorina littorea', 'Common periwinkle', 'mollusc', null),
  taxon('Asterias rubens', 'Common starfish', 'echinoderm', null),
  taxon('Strongylocentrotus droebachiensis', 'Green sea urchin', 'echinoderm', null),
  taxon('Acropora spp.', 'Staghorn corals', 'coral', null),
  taxon('Pocillopora damicornis', 'Cauliflower coral', 'coral', null),
  taxon('Fimbriaphyllia ancora', 'Anchor coral', 'coral', null),
  taxon('Phoca vitulina', 'Harbor seal', 'mammal', ['50', '140', 'kg'], anAge('115')),
  taxon('Zalophus californianus', 'California sea lion', 'mammal', ['75', '390', 'kg'], anAge('180')),
  taxon('Tursiops truncatus', 'Bottlenose dolphin', 'mammal', ['130', '350', 'kg'], anAge('200')),
]
