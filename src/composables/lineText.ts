import type { Diagnostic, LineResult, Span } from '#engine';

export interface SourcePiece {
  text: string;
  marked: boolean;
}

/** The source of a line cut where a diagnostic points, so that the place can be marked. */
export function markedSource(source: string, line: Span, place: Span | undefined): SourcePiece[] {
  const text = source.slice(line.from, line.to);
  if (place === undefined || place.to <= line.from || place.from >= line.to) return [{ text, marked: false }];
  const from = Math.max(place.from, line.from);
  const to = Math.min(Math.max(place.to, from + 1), line.to);
  return [
    { text: source.slice(line.from, from), marked: false },
    { text: source.slice(from, to), marked: true },
    { text: source.slice(to, line.to), marked: false },
  ].filter((piece) => piece.text !== '');
}

/** What stands in bands beneath a line; hints are for the one who writes and stay in the editor. */
export function shownProblems(diagnostics: readonly Diagnostic[]): Diagnostic[] {
  return diagnostics.filter((diagnostic) => diagnostic.severity !== 'hint');
}

export function firstError(diagnostics: readonly Diagnostic[]): Diagnostic | undefined {
  return diagnostics.find((diagnostic) => diagnostic.severity === 'error');
}

/** Diagnostics of a cell that belong to none of its lines. */
export function problemsOfCell(diagnostics: readonly Diagnostic[], lines: readonly LineResult[]): Diagnostic[] {
  const ofLines = new Set(lines.flatMap((line) => line.diagnostics.map((diagnostic) => diagnostic.message)));
  return shownProblems(diagnostics).filter((diagnostic) => !ofLines.has(diagnostic.message));
}
