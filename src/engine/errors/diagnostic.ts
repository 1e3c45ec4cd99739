/** A stretch of a cell's source, as offsets of UTF-16 code units; `to` is exclusive. */
export interface Span {
  from: number;
  to: number;
}

export type Severity = 'error' | 'warning' | 'hint';

/** A change that would mend the diagnostic in one step: put `insert` in place of `span`. */
export interface Mend {
  label: string;
  span: Span;
  insert: string;
}

/**
 * What is wrong (or worth knowing) at one place of a calculation.
 * `message` is a whole sentence for an engineer; `code` is stable and meant for programs.
 */
export interface Diagnostic {
  code: string;
  severity: Severity;
  message: string;
  /** Where in the source of the cell; absent when it concerns the cell as a whole. */
  span?: Span;
  /** The values behind the sentence: limits, names, units. */
  parameters?: Readonly<Record<string, string | number>>;
  mend?: Mend;
}
