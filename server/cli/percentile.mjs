/**
 * The value that `share` of the measurements do not exceed (nearest rank), so that it is always one that was measured.
 *
 * @param {readonly number[]} values at least one
 * @param {number} share 0.5 for the median, 0.95 for p95
 */
export function percentile(values, share) {
  const sorted = [...values].sort((a, b) => a - b)
  return sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)] ?? Number.NaN
}
