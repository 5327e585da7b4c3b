/**
 * The arithmetic of circleSegmentArea with its numbers put in, for a working line in square metres.
 *
 * @param radius and height as terms of an expression, with their units
 */
export function circleSegmentExpression(radius: string, height: string): string {
  const angle = `2 * asin(sqrt((${height}) / (2 * ${radius})))`
  return `(${radius})^2 * ${angle} - (${radius} - ${height}) * sqrt(${height} * (2 * ${radius} - ${height})) to m2`
}
