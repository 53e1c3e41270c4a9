/* The five grades of reported turbulence, from nil upward, and their words. */
const WORDS = { NIL: 'nil', LGT: 'light', MOD: 'moderate', SEV: 'severe', EXTRM: 'extreme' };
const ORDER = Object.keys(WORDS);

export const intensityWord = code => WORDS[code] ?? 'not stated';

/** Sorts heavier first. */
export const heavierFirst = (a, b) => ORDER.indexOf(b) - ORDER.indexOf(a);
