import type { Diagnostic } from './diagnostic';

/** Why a substance has no value for what was asked. */
export type PropertyErrorCode =
  | 'OUT_OF_RANGE_T'
  | 'OUT_OF_RANGE_P'
  | 'OUT_OF_RANGE_STATE'
  | 'OUT_OF_RANGE_QUALITY'
  | 'NOT_ABSOLUTE'
  | 'WRONG_PHASE'
  | 'AMBIGUOUS_AT_SATURATION'
  | 'TWO_PHASE_PROPERTY'
  | 'TWO_PHASE_OR_LIQUID_AIR'
  | 'SUPERCRITICAL_NO_SATURATION'
  | 'TRANSPORT_OUT_OF_RANGE'
  | 'UNSUPPORTED_INPUT'
  | 'WARN_NEAR_CRITICAL'
  | 'WARN_HIGH_T_DISSOCIATION';

/** A reason with its sentence; codes that begin with WARN stand beside a value that is given. */
export function propertyError(
  code: PropertyErrorCode,
  message: string,
  parameters: Record<string, string | number> = {},
): Diagnostic {
  return { code, severity: code.startsWith('WARN') ? 'warning' : 'error', message, parameters };
}

const shown = (value: number, digits = 6) => String(Number(value.toPrecision(digits))).replace('-', '−');

/** `22.85 °C` */
export const celsius = (T: number): string => `${shown(Number((T - 273.15).toFixed(2)))} °C`;
/** `2.5 bar` */
export const bars = (p: number): string => `${shown(p / 1e5, 4)} bar`;

/** A temperature outside a formulation, with the nearest that it covers. */
export function temperatureOutside(T: number, [low, high]: readonly [number, number], formulation: string): Diagnostic {
  const nearest = T < low ? low : high;
  return propertyError(
    'OUT_OF_RANGE_T',
    `${celsius(T)} is outside ${formulation}, which covers ${celsius(low)} to ${celsius(high)}. Nearest: ${celsius(nearest)}.`,
    { T, low, high, nearest },
  );
}

/** A pressure outside a formulation, with the nearest that it covers. */
export function pressureOutside(p: number, [low, high]: readonly [number, number], formulation: string): Diagnostic {
  if (p <= 0)
    return propertyError(
      'NOT_ABSOLUTE',
      `A pressure of ${bars(p)} is not absolute: absolute pressures are above zero. Gauge pressures are written in barg or psig.`,
      { p },
    );
  const nearest = p < low ? low : high;
  return propertyError(
    'OUT_OF_RANGE_P',
    `${bars(p)} is outside ${formulation}, which covers ${bars(low)} to ${bars(high)}. Nearest: ${bars(nearest)}.`,
    { p, low, high, nearest },
  );
}
