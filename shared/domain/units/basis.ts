/**
 * What a concentration is a concentration *of*. The same number on another basis is another dose: formalin by 2.5 times,
 * copper by 3.9 times. No conversion joins two bases; a calculator that can go from one to the other asks for
 * strength, density or molar masses and shows it in the working.
 *
 * - `active`   the active moiety itself, mg/L
 * - `product`  the product as it stands on the shelf, µL/L or mg/L
 * - `salt`     the salt or hydrate that the drug is sold as (chloroquine diphosphate, copper sulfate pentahydrate)
 * - `base`     the base of a drug sold as a salt
 * - `free`     the free ion as a test kit reads it (free copper)
 * - `total`    free and bound together (chelated copper)
 */
export const concentrationBases = ['active', 'product', 'salt', 'base', 'free', 'total'] as const

export type ConcentrationBasis = (typeof concentrationBases)[number]
