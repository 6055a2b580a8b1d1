/** U.S. Standard Atmosphere 1976 / ICAO, troposphere. */
const SEA_LEVEL_PA = 101_325;
const SEA_LEVEL_K = 288.15;
const LAPSE_K_PER_M = 0.0065;
const EXPONENT = 5.255_876;

/** Where the formula holds and trucks are parked. */
const LOWEST_M = -500;
const HIGHEST_M = 6000;

/**
 * Air pressure at a yard on a standard day, Pa absolute.
 * `elevationM` −500 to 6 000 m; outside throws RangeError.
 */
export function stationPressure(elevationM: number): number {
  if (!(elevationM >= LOWEST_M && elevationM <= HIGHEST_M)) {
    throw new RangeError(`elevation ${elevationM} m is outside ${LOWEST_M} to ${HIGHEST_M} m`);
  }
  return SEA_LEVEL_PA * (1 - (LAPSE_K_PER_M * elevationM) / SEA_LEVEL_K) ** EXPONENT;
}

/** The deepest vacuum a gauge can show at a yard, Pa below its air: all of the air there is. */
export function greatestVacuum(elevationM: number): number {
  return stationPressure(elevationM);
}

/**
 * End vacuum to expect at a yard of a pump that makes `seaLevelVacuumPa` at sea level, Pa below
 * the yard's air. The pressure a pump leaves behind is the same everywhere; only the air above
 * it changes. Never below zero.
 */
export function vacuumAtElevation(seaLevelVacuumPa: number, elevationM: number): number {
  const left = SEA_LEVEL_PA - seaLevelVacuumPa;
  return Math.max(0, stationPressure(elevationM) - left);
}
