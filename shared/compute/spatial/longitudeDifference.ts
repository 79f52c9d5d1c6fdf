/**
 * Signed way from one meridian to another, the short way round: outlines on both sides of the 180° meridian
 * stay in one piece.
 *
 * @param fromDeg longitude [°], any finite number
 * @param toDeg longitude [°], any finite number
 * @returns toDeg − fromDeg [°], in [−180, 180)
 * @example
 * longitudeDifference(10, 13.5) // => 3.5
 * longitudeDifference(179.9, -179.9) // => 0.2
 */
export function longitudeDifference(fromDeg: number, toDeg: number): number {
  const difference = toDeg - fromDeg
  return difference >= -180 && difference < 180 ? difference : ((((difference + 180) % 360) + 360) % 360) - 180
}
