import type { Diagnostic } from '../../errors/diagnostic';
import { propertyError } from '../../errors/property-errors';

/** The warning that belongs to a state within 0.8 % of the critical temperature and 4.5 % of the pressure. */
export function nearCritical(T: number, p: number, critical: { T: number; p: number }): Diagnostic[] {
  const near = Math.abs(T / critical.T - 1) < 0.008 && Math.abs(p / critical.p - 1) < 0.045;
  return near ? [propertyError('WARN_NEAR_CRITICAL', { T, p })] : [];
}
