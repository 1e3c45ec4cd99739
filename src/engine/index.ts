// The door of the engine: named exports only.
export type { Diagnostic, Mend, Severity, Span } from './errors/diagnostic';
export type * from './calculation/types';
export type * from './language/tree';
export type * from './properties/types';
export type * from './relations/types';
