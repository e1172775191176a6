/**
 * Outline of a ferrule lying from left to right with its tip at `to`: chamfered when flat, cut at the polish angle
 * when angled. The angle is drawn twice as large below 20 degrees, since 8 degrees must be told from 0 at arm's length.
 */
export function ferrulePath(from: number, to: number, axisY: number, halfHeight: number, angleDeg: number): string {
  const top = axisY - halfHeight;
  const bottom = axisY + halfHeight;
  if (angleDeg <= 0) {
    const chamfer = Math.min(10, (to - from) * 0.17);
    const rim = halfHeight * 0.62;
    return `M${from} ${top}H${to - chamfer}L${to} ${axisY - rim}V${axisY + rim}L${to - chamfer} ${bottom}H${from}Z`;
  }
  const lean = Math.tan((Math.min(2 * angleDeg, 40) * Math.PI) / 180) * halfHeight;
  return `M${from} ${top}H${to - 2 * lean - 4}L${to - 2 * lean} ${top + 4}L${to} ${bottom - 2}L${to - 2} ${bottom}H${from}Z`;
}

/** The fibre within it. */
export function ferruleAxis(from: number, to: number, axisY: number): string {
  return `M${from} ${axisY}H${to - Math.min(5, (to - from) * 0.1)}`;
}
