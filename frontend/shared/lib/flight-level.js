/*
 * Flight level: pressure altitude in hundreds of feet in the ICAO standard atmosphere. Level and height are
 * different axes; between them only a sounding's own pairs may convert. The formulas here turn a level into the
 * pressure that defines it, which needs no sounding.
 */
import { isNumber, METRES_PER_FOOT, MISSING } from './units.js';

/** `FL290`, always three figures; below the surface of 1013.25 hPa `FL000` is not invented: `FL-01`. */
export function flightLevelText(level) {
  if (!isNumber(level)) return MISSING;
  const whole = Math.round(level);
  return whole < 0 ? `FL\u2212${String(-whole).padStart(2, '0')}` : `FL${String(whole).padStart(3, '0')}`;
}

const SURFACE_HPA = 1013.25;
const SURFACE_K = 288.15;
const LAPSE_K_PER_M = 0.0065;
const GAS = 287.05287;
const GRAVITY = 9.80665;
const TROPOPAUSE_M = 11000;
const TROPOPAUSE_K = SURFACE_K - LAPSE_K_PER_M * TROPOPAUSE_M;
const EXPONENT = GRAVITY / (GAS * LAPSE_K_PER_M);
const TROPOPAUSE_HPA = SURFACE_HPA * (TROPOPAUSE_K / SURFACE_K) ** EXPONENT;

/** Pressure [hPa] of a flight level (ICAO standard atmosphere, up to FL656). */
export function pressureOfFlightLevel(level) {
  const metres = level * 100 * METRES_PER_FOOT;
  return metres <= TROPOPAUSE_M
    ? SURFACE_HPA * (1 - LAPSE_K_PER_M * metres / SURFACE_K) ** EXPONENT
    : TROPOPAUSE_HPA * Math.exp(-GRAVITY * (metres - TROPOPAUSE_M) / (GAS * TROPOPAUSE_K));
}

/** `+400 ft`, `0 ft`, `−1200 ft`: how far a report's level lies from another, to the hundred feet levels resolve. */
export function levelDifferenceText(level, reference) {
  const feet = Math.round(level - reference) * 100;
  return feet === 0 ? '0 ft' : `${feet > 0 ? '+' : '\u2212'}${Math.abs(feet)} ft`;
}
