/* The five grades of reported turbulence, from nil upward, and their words; a forecast may also stand between two. */
const WORDS = { NIL: 'nil', LGT: 'light', MOD: 'moderate', SEV: 'severe', EXTRM: 'extreme' };
const ORDER = Object.keys(WORDS);
const OCCASIONALLY_SEVERE = 'MOD_OCNL_SEV';

export const intensityWord = code => (code === OCCASIONALLY_SEVERE ? 'moderate, occasionally severe' : WORDS[code] ?? 'not stated');

/** The grade whose symbol and line a forecast is drawn with. */
export const mainGrade = code => (code === OCCASIONALLY_SEVERE ? 'MOD' : code);

export const isOccasionallySevere = code => code === OCCASIONALLY_SEVERE;

/** Sorts heavier first. */
export const heavierFirst = (a, b) => ORDER.indexOf(b) - ORDER.indexOf(a);
