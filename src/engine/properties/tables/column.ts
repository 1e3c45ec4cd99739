import type { Column } from './types';

/** Ends of a column; of a single value no ends. */
export function columnRange({ T }: Column): readonly [number, number] | undefined {
  return T.length < 2 ? undefined : [T[0] ?? NaN, T[T.length - 1] ?? NaN];
}

/** Linear between the nodes, of viscosities the logarithm over 1/T; undefined outside. */
export function interpolate({ T: nodes, values, logarithmic }: Column, T: number): number | undefined {
  if (nodes.length < 2) return values[0];
  let upper = nodes.findIndex((node) => node >= T);
  if (upper === 0 && nodes[0] === T) upper = 1;
  if (upper <= 0) return undefined;
  const [T0, T1] = [nodes[upper - 1] ?? NaN, nodes[upper] ?? NaN];
  const [v0, v1] = [values[upper - 1] ?? NaN, values[upper] ?? NaN];
  if (logarithmic === true) {
    const part = (1 / T - 1 / T0) / (1 / T1 - 1 / T0);
    return v0 * (v1 / v0) ** part;
  }
  return v0 + ((v1 - v0) * (T - T0)) / (T1 - T0);
}

/** Slope of a linear column at T, for the expansion coefficient. */
export function slopeOf({ T: nodes, values }: Column, T: number): number | undefined {
  if (nodes.length < 2) return undefined;
  const upper = Math.max(
    1,
    nodes.findIndex((node) => node >= T),
  );
  return ((values[upper] ?? NaN) - (values[upper - 1] ?? NaN)) / ((nodes[upper] ?? NaN) - (nodes[upper - 1] ?? NaN));
}
