/**
 * What a mechanic reads off a gauge, a feeler or a screw: parsed as it is said, kept in one unit a dimension.
 * Pressure is kept in pascals, turns in turns, length in millimetres, torque in newton metres.
 */
export type Dimension =
  'pressure' | 'turns' | 'length' | 'voltage' | 'resistance' | 'torque' | 'temperature' | 'share' | 'plain';

type UnitFacts = {
  dimension: Dimension;
  factor: number;
  places: number;
  word: string;
  spoken: readonly string[];
};

/**
 * `factor` turns one of the unit into one of what is kept; `places` is how finely it is shown.
 * psi and lb·ft follow from the exact pound (0.45359237 kg), inch (25.4 mm) and standard gravity (9.80665 m/s²).
 */
const UNITS = {
  psi: { dimension: 'pressure', factor: 6894.757293168, places: 1, word: 'psi', spoken: ['psi'] },
  kPa: { dimension: 'pressure', factor: 1000, places: 1, word: 'kPa', spoken: ['kpa'] },
  bar: { dimension: 'pressure', factor: 100_000, places: 2, word: 'bar', spoken: ['bar'] },
  turns: { dimension: 'turns', factor: 1, places: 3, word: 'turns', spoken: ['turns', 'turn'] },
  mm: { dimension: 'length', factor: 1, places: 2, word: 'mm', spoken: ['mm'] },
  in: { dimension: 'length', factor: 25.4, places: 3, word: 'in', spoken: ['in', 'inch', '"'] },
  V: { dimension: 'voltage', factor: 1, places: 2, word: 'V', spoken: ['v', 'volt', 'volts'] },
  Ω: { dimension: 'resistance', factor: 1, places: 2, word: 'Ω', spoken: ['ω', 'ohm', 'ohms'] },
  'N·m': { dimension: 'torque', factor: 1, places: 1, word: 'N·m', spoken: ['n·m', 'nm'] },
  'lb·ft': {
    dimension: 'torque',
    factor: 1.3558179483314004,
    places: 1,
    word: 'lb·ft',
    spoken: ['lb·ft', 'lbft', 'ft·lb', 'ftlb'],
  },
  '°C': { dimension: 'temperature', factor: 1, places: 1, word: '°C', spoken: ['°c', 'c'] },
  '%': { dimension: 'share', factor: 1, places: 1, word: '%', spoken: ['%'] },
  '': { dimension: 'plain', factor: 1, places: 3, word: '', spoken: [''] },
} as const satisfies Record<string, UnitFacts>;

export type MeasuredUnit = keyof typeof UNITS;
export const MEASURED_UNITS = Object.keys(UNITS) as MeasuredUnit[];

/** One run of a measurement: what was typed, in which unit of measure, and its value as it is kept. */
export type MeasuredValue = { typed: string; unit: MeasuredUnit; value: number };

const GLYPHS: Record<string, string> = {
  '¼': '1/4',
  '½': '1/2',
  '¾': '3/4',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
  '⅓': '1/3',
  '⅔': '2/3',
};
const EIGHTHS = ['', '⅛', '¼', '⅜', '½', '⅝', '¾', '⅞'];
const NUMBER =
  /^(?<sign>[-−])?(?:(?<whole>\d{1,7})\s+(?<over>\d{1,4})\/(?<under>\d{1,4})|(?<top>\d{1,4})\/(?<bottom>\d{1,4})|(?<decimal>\d{1,7}(?:[.,]\d{1,6})?|[.,]\d{1,6}))(?<unit>.*)$/u;

/** Whether this is the name of a unit of measure known here. */
export function isMeasuredUnit(name: string): name is MeasuredUnit {
  return Object.hasOwn(UNITS, name);
}

/** What a unit of measure measures. */
export function dimensionOf(unit: MeasuredUnit): Dimension {
  return UNITS[unit].dimension;
}

/** The units of measure of one dimension, the given one first: what an entry may be typed in. */
export function listUnitsLike(unit: MeasuredUnit): MeasuredUnit[] {
  const alike = MEASURED_UNITS.filter((other) => dimensionOf(other) === dimensionOf(unit) && other !== unit);
  return [unit, ...alike];
}

/** From a number in `unit` to the value that is kept. */
export function toKept(value: number, unit: MeasuredUnit): number {
  return value * UNITS[unit].factor;
}

/** From the value that is kept to a number in `unit`. */
export function fromKept(value: number, unit: MeasuredUnit): number {
  return value / UNITS[unit].factor;
}

/**
 * Reads what a mechanic says: `1 1/4`, `1¼`, `1.25` or `1,25`, with a unit of measure after it where it is not
 * `unit`. Answers what is wrong instead, in words that follow the field's name.
 */
export function parseMeasured(text: string, unit: MeasuredUnit): MeasuredValue | { fault: string } {
  const typed = text.trim();
  if (typed === '') return { fault: 'is empty' };
  const plain = typed.replace(/[¼½¾⅛⅜⅝⅞⅓⅔]/gu, (glyph) => ` ${GLYPHS[glyph]!}`).trim();
  const parts = NUMBER.exec(plain)?.groups;
  if (!parts) return { fault: 'is not a number as 1.25, 1 1/4 or 1¼' };
  if (Number(parts.under ?? parts.bottom ?? 1) === 0) return { fault: 'divides by zero' };
  const said = findSpoken(parts.unit ?? '', unit);
  if (said === null)
    return {
      fault: `is not in a unit known here: use ${listUnitsLike(unit).filter(Boolean).join(', ') || 'a bare number'}`,
    };
  if (dimensionOf(said) !== dimensionOf(unit))
    return { fault: `is in ${said}, not in ${unit || 'a bare number'}` };
  const number =
    parts.whole !== undefined
      ? Number(parts.whole) + Number(parts.over) / Number(parts.under)
      : parts.top !== undefined
        ? Number(parts.top) / Number(parts.bottom)
        : Number(parts.decimal!.replace(',', '.'));
  return { typed, unit: said, value: toKept(parts.sign ? -number : number, said) };
}

/** The unit named after a number, `usual` when none is; null for a word that names none. */
function findSpoken(text: string, usual: MeasuredUnit): MeasuredUnit | null {
  const word = text
    .trim()
    .toLowerCase()
    .replaceAll(/[\s.-]/g, '');
  if (word === '') return usual;
  return MEASURED_UNITS.find((unit) => (UNITS[unit].spoken as readonly string[]).includes(word)) ?? null;
}

/** A kept value in `unit`: '25 psi', '1¼ turns', '0.5 turns'; eighths of a turn as fractions. */
export function formatMeasured(value: number, unit: MeasuredUnit): string {
  const number = fromKept(value, unit);
  const { places, word } = UNITS[unit];
  const text = unit === 'turns' ? formatTurns(number) : trim(number, places);
  if (word === '') return text;
  return word === '%' ? `${text} %` : `${text} ${unit === 'turns' && isOne(number) ? 'turn' : word}`;
}

const isOne = (turns: number) => turns > 0 && turns <= 1;

function formatTurns(turns: number): string {
  const eighths = turns * 8;
  if (turns < 0 || Math.abs(eighths - Math.round(eighths)) > 1e-9) return trim(turns, 3);
  const [whole, rest] = [Math.floor(Math.round(eighths) / 8), Math.round(eighths) % 8];
  return rest === 0 ? String(whole) : `${whole === 0 ? '' : whole}${EIGHTHS[rest]!}`;
}

function trim(number: number, places: number): string {
  const text = number.toFixed(places);
  return (text.includes('.') ? text.replace(/\.?0+$/, '') : text).replace(/^-0$/, '0').replace('-', '−');
}
