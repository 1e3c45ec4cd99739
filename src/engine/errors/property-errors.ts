import type { Diagnostic, Severity } from './diagnostic';

/**
 * Why a substance has no value for what was asked, or what is to be known about one that it has.
 * `{word}` stands for a parameter.
 */
const table = {
  OUT_OF_RANGE_T: ['error', '{given} is outside {formulation}, which covers {from} to {to}. Nearest: {nearest}.'],
  OUT_OF_RANGE_P: ['error', '{given} is outside {formulation}, which covers {from} to {to}. Nearest: {nearest}.'],
  OUT_OF_RANGE_STATE: ['error', '{problem}.'],
  OUT_OF_RANGE_QUALITY: [
    'error',
    'A vapour quality of {given} is none: it lies between 0 (liquid) and 1 (vapour). Nearest: {nearest}.',
  ],
  OUT_OF_RANGE_COMPOSITION: [
    'error',
    'A mass fraction of {given} is outside {formulation}, which covers {from} to {to}{hint}. Nearest: {nearest}.',
  ],
  OUT_OF_RANGE_RH: [
    'error',
    'A relative humidity of {given} is none: it lies between 0 and 1{hint}. Nearest: {nearest}.',
  ],
  NOT_ABSOLUTE: [
    'error',
    'A pressure of {given} is not absolute: absolute pressures are above zero. Gauge pressures are written in barg or psig.',
  ],
  BELOW_FREEZING: ['error', '{name} freezes at {freezing}{condition}; {given} is below.'],
  BELOW_TRIPLE_POINT: [
    'error',
    '{given} is below the triple point of {name}, where {formulation} begins. Nearest: {nearest}.',
  ],
  WRONG_PHASE: ['error', 'At {temperature} and {pressure} {name} is {natural}, not {wanted}{reason}.'],
  AMBIGUOUS_AT_SATURATION: [
    'error',
    'At {pressure} {name} boils at {boiling}: with {temperature} the phase is not certain. Give p and x (0 liquid, 1 vapour), or ask for saturation.',
  ],
  TWO_PHASE_PROPERTY: [
    'error',
    'This property has no value between the phases; take it from the saturation pair (liquid and vapour).',
  ],
  TWO_PHASE_OR_LIQUID_AIR: [
    'error',
    'At {temperature} {name} condenses above {dew}; only the gas is carried. This is {pressure}.',
  ],
  SUPERCRITICAL_NO_SATURATION: ['error', 'Above the critical point ({critical}) {name} has no saturation.'],
  TRANSPORT_OUT_OF_RANGE: ['error', '{quantity} ({equation}) covers {from} to {to}; this is {given}.'],
  SUPERSATURATED: ['error', '{problem}.'],
  PWS_ABOVE_P: ['error', '{problem}.'],
  WET_BULB_ABOVE_DRY_BULB: ['error', '{problem}.'],
  UNSUPPORTED_INPUT: ['error', '{name} takes {inputs}.'],
  PROPERTY_NOT_AVAILABLE: ['error', '{reason}.'],
  WARN_NEAR_CRITICAL: [
    'warning',
    'Close to the critical point properties change steeply and their uncertainty is larger than stated.',
  ],
  WARN_HIGH_T_DISSOCIATION: [
    'warning',
    'Above {limit} {name} begins to dissociate, which the formulation does not carry.',
  ],
  WARN_BEYOND_MEASUREMENTS: [
    'warning',
    'The measurements behind {formulation} end at {limit}; at {given} the equation is used beyond them.',
  ],
  WARN_BOILING_NOT_CARRIED: [
    'warning',
    'The vapour pressure of {name} is not carried: at {temperature} it is a liquid for certain above {certain} only; this is {pressure}.',
  ],
  WARN_ESTIMATED_PROPERTY: ['warning', '{problem}.'],
} as const satisfies Readonly<Record<string, readonly [Severity, string]>>;

export type PropertyErrorCode = keyof typeof table;

export const propertyErrorCodes = Object.keys(table) as PropertyErrorCode[];

/** A reason with its sentence from the table, the parameters put in; codes that begin with WARN stand beside a value. */
export function propertyError(
  code: PropertyErrorCode,
  parameters: Readonly<Record<string, string | number>> = {},
): Diagnostic {
  const [severity, sentence] = table[code];
  const message = sentence.replace(/\{(\w+)\}/g, (_, name: string) => String(parameters[name] ?? ''));
  return { code, severity, message: message.charAt(0).toUpperCase() + message.slice(1), parameters };
}

const shown = (value: number, digits = 6) => String(Number(value.toPrecision(digits))).replace('-', '−');

/** `22.85 °C` */
export const celsius = (T: number): string => `${shown(Number((T - 273.15).toFixed(2)))} °C`;
/** `2.5 bar` */
export const bars = (p: number): string => `${shown(p / 1e5, 4)} bar`;
/** A plain number as a reader sees it. */
export const plain = (value: number): string => shown(value);

/** A temperature outside a formulation, with the nearest that it covers. */
export function temperatureOutside(T: number, [low, high]: readonly [number, number], formulation: string): Diagnostic {
  const nearest = T < low ? low : high;
  return propertyError('OUT_OF_RANGE_T', {
    given: celsius(T),
    formulation,
    from: celsius(low),
    to: celsius(high),
    nearest: celsius(nearest),
    T,
    low,
    high,
  });
}

/** A pressure outside a formulation, with the nearest that it covers. */
export function pressureOutside(p: number, [low, high]: readonly [number, number], formulation: string): Diagnostic {
  if (p <= 0) return propertyError('NOT_ABSOLUTE', { given: bars(p), p });
  const nearest = p < low ? low : high;
  return propertyError('OUT_OF_RANGE_P', {
    given: bars(p),
    formulation,
    from: bars(low),
    to: bars(high),
    nearest: bars(nearest),
    p,
    low,
    high,
  });
}
