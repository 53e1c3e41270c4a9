/*
 * Numbers as the desk writes them: decimal point, true minus, a thin space between thousands, a dash for what
 * is missing and never 0.
 */
export const METRES_PER_FOOT = 0.3048;
export const MS_PER_KNOT = 0.514444;
/** 1 kt per 1000 ft in s⁻¹. */
export const PER_SECOND_PER_KT_PER_1000_FT = MS_PER_KNOT / (1000 * METRES_PER_FOOT);
export const MISSING = '\u2013';

const MINUS = '\u2212';
const THIN_SPACE = '\u2009';

export const isNumber = value => typeof value === 'number' && Number.isFinite(value);

/** A fixed number of decimals; a dash where there is no number. */
export function fixed(value, decimals) {
  if (!isNumber(value)) return MISSING;
  const text = Math.abs(value).toFixed(decimals);
  const [whole, part] = text.split('.');
  const spaced = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : whole;
  const sign = value < 0 && Number(text) !== 0 ? MINUS : '';
  return sign + spaced + (part ? `.${part}` : '');
}

/** Richardson number: two decimals below 1, one from 1 to 10, `>10` above; below 0 the air is overturned. */
export function richardsonText(value) {
  if (!isNumber(value)) return MISSING;
  if (value > 10) return '>10';
  if (value < 0) return 'overturned';
  return value < 0.995 ? fixed(value, 2) : fixed(value, 1);
}

/** Shear in kt/1000 ft, one decimal. */
export const shearText = ktPer1000Ft => fixed(ktPer1000Ft, 1);

/** N² with two significant figures, `1.5e-4` with a true minus. */
export function n2Text(perS2) {
  return isNumber(perS2) ? perS2.toExponential(1).replaceAll('-', MINUS).replace('e+', 'e') : MISSING;
}

/** Probability between 0 and 1, two decimals. */
export const probabilityText = probability => fixed(probability, 2);

/** Probability of a product in whole tens: `80 %`. */
export const percentText = percent => (isNumber(percent) ? `${fixed(percent, 0)} %` : MISSING);

/** Height in km, two decimals: `8.69 km`. */
export const kilometresText = metres => (isNumber(metres) ? `${fixed(metres / 1000, 2)} km` : MISSING);

/** `315 hPa`; tenths above the 100 hPa level. */
export const pressureText = hPa => (isNumber(hPa) ? `${fixed(hPa, hPa < 100 ? 1 : 0)} hPa` : MISSING);

export const knotsText = knots => (isNumber(knots) ? `${fixed(knots, 0)} kt` : MISSING);
export const nauticalMilesText = nm => (isNumber(nm) ? `${fixed(nm, 0)} NM` : MISSING);
export const feetToMetres = feet => feet * METRES_PER_FOOT;
export const metresToFeet = metres => metres / METRES_PER_FOOT;
export const knotsToMs = knots => knots * MS_PER_KNOT;
export const msToKnots = ms => ms / MS_PER_KNOT;
