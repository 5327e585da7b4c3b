/**
 * SQL: the date, month or year that the registrar entered, where a row of an animal stands in its ledger by that alone;
 * null where its time of day is known. Only transactions of the register are entered without a time; everything that one
 * of them wrote has its instant.
 *
 * @param animal SQL of the id of the animal
 * @param at     SQL of the instant of the row
 */
export const knownOn = (animal: string, at: string) => `
  (SELECT d.happened_text FROM transaction_lines n JOIN transactions d ON d.id = n.transaction_id
    WHERE n.animal_id = ${animal} AND d.happened_at = ${at} AND d.happened_time IS NULL LIMIT 1)`
