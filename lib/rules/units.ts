/** A length in millimetres. */
export type Mm = number & { readonly __unit: 'mm' }
/** An angle in degrees. */
export type Deg = number & { readonly __unit: 'deg' }

/** Names a plain number as millimetres. */
export function mm(value: number): Mm {
  return value as Mm
}

/** Names a plain number as degrees. */
export function deg(value: number): Deg {
  return value as Deg
}

/**
 * Two angles nearer than this are the same: it swallows the rounding of `atan2` (about 1e-14°) so that a limit is inclusive to the last
 * digit, and is a ten-millionth of what any tape can show, so no car gains by it.
 */
export const ANGLE_TOLERANCE_DEG = 1e-9

/** Whether `angle` lies above `limit`; on the limit is not above. */
export function isAbove(angle: Deg, limit: number): boolean {
  return angle > limit + ANGLE_TOLERANCE_DEG
}

/** Whether `angle` lies below `limit`; on the limit is not below. */
export function isBelow(angle: Deg, limit: number): boolean {
  return angle < limit - ANGLE_TOLERANCE_DEG
}

/** Angle of a strap below the horizontal, from the level run and the drop; negative when it climbs. */
export function angleBelowHorizontal(run: Mm, drop: Mm): Deg {
  return deg((Math.atan2(drop, run) * 180) / Math.PI)
}

/**
 * Rounds for show without ever landing on the limit unless the value is on it: 45.04 against 45 is shown as 45.04, never as "45.0 over 45".
 * The decision itself is always made on the exact value.
 */
export function roundBeside(value: number, limit: number, decimals: number): number {
  for (let places = decimals; places <= 6; places += 1) {
    const rounded = roundTo(value, places)
    if (rounded !== limit || Math.abs(value - limit) <= ANGLE_TOLERANCE_DEG) return rounded
  }
  return value
}

/** Rounds to that many decimals. */
export function roundTo(value: number, decimals: number): number {
  return Number(value.toFixed(decimals))
}
