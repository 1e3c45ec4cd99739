import type { RevisionDetail } from '#contract';
import { toExchange, type CalculationDocument } from '#document';

/** Hands the sheet as it stands in this window over as a file, so that nothing written is lost. */
export function saveCopy(document: CalculationDocument, detail: RevisionDetail): void {
  const { calculation, revision } = detail;
  const exchange = toExchange(document, {
    number: calculation.number,
    title: calculation.title,
    revision: revision.letter,
    state: revision.state,
  });
  const file = new Blob([JSON.stringify(exchange, null, 2)], { type: 'application/json' });
  const link = window.document.createElement('a');
  link.href = URL.createObjectURL(file);
  link.download = `${calculation.number}-${revision.letter}-copy.json`;
  link.click();
  URL.revokeObjectURL(link.href);
}
