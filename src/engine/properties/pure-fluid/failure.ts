import { propertyError, type PropertyErrorCode } from '../../errors/property-errors';
import type { Diagnostic } from '../../errors/diagnostic';

export interface Failure {
  ok: false;
  error: Diagnostic;
}

export const failed = (error: Diagnostic): Failure => ({ ok: false, error });

export const refused = (code: PropertyErrorCode, parameters: Record<string, string | number> = {}): Failure =>
  failed(propertyError(code, parameters));
