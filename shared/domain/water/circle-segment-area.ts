/**
 * Area of the segment of a circle below a chord, in the square of the unit of its arguments:
 * R² × 2 arcsin(√(h ÷ 2R)) − (R − h) × √(h × (2R − h)).
 *
 * The arcsine form is the usual arccosine form, R² arccos((R − h) ÷ R), without its loss of digits where the segment is
 * thin; circleSegmentExpression writes the same arithmetic.
 *
 * @param radius R, above zero
 * @param height h, 0…2R
 * @source mensuration · check values geom.13 to geom.22
 */
export function circleSegmentArea(radius: number, height: number): number {
  const angle = 2 * Math.asin(Math.sqrt(height / (2 * radius)))
  return radius ** 2 * angle - (radius - height) * Math.sqrt(height * (2 * radius - height))
}
