/** A property of a liquid by temperature in K and, of mixtures, the mass fraction of the solute. */
export type LiquidProperty = (T: number, x: number) => number;

/** A liquid whose properties do not depend on pressure, as closed equations. */
export interface Liquid {
  id: string;
  name: string;
  /** As it stands in a sentence: `ethylene glycol in water`. */
  word: string;
  aliases: string[];
  formulation: string;
  sources: string[];
  range: string;
  temperature: [number, number];
  /** Mixtures: mass fractions covered, and a word on a usual slip. */
  composition?: { range: [number, number]; hint?: string };
  rho: LiquidProperty;
  cp: LiquidProperty;
  mu: LiquidProperty;
  k: LiquidProperty;
  freezing?: (x: number) => number;
  /** Vapour pressure in Pa, from the temperature on where it is known. */
  vapourPressure?: { from: number; value: LiquidProperty };
  /** Where the vapour pressure is not carried: pressure in Pa above which it is a liquid for certain. */
  certainlyLiquidAbove?: LiquidProperty;
  uncertainty: Partial<Record<'rho' | 'cp' | 'mu' | 'k' | 'Pr', string>>;
}
