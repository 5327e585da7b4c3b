/**
 * Calculators whose published values stand in cases/ and which no engine computes yet. The list only shrinks: a
 * calculator leaves it in the change that adds its runner.
 */
export const notYet: readonly string[] = [
  'unionized_ammonia_fraction',
  'unionized_ammonia_concentration',
  'ammonium_pKa_freshwater',
  'unionized_ammonia_fraction_clegg_whitfield',
  'nh3_from_nh3n',
  'nh3n_from_nh3',
  'nh4_from_nh4n',
  'salt_mass_simple_kg',
  'salt_mass_by_mass_balance_kg',
  'salt_mass_with_moisture_kg',
  'evaporation_topup_L',
]
