import { nextTick } from 'vue';
import type { CalculationDocument } from '#document';
import type { SheetCommands } from './sheetContext';

/** What most sheets are divided into. */
const usualSections = ['Purpose and basis', 'Givens', 'Fluid and flow', 'Heat transfer', 'Result'];

/** The ways to begin an empty sheet. */
export function beginnings(document: () => CalculationDocument | undefined, commands: SheetCommands) {
  return {
    /** All heads at once: one step of undo. */
    layOutSections(): void {
      document()?.transact(() => {
        let after: string | null = null;
        for (const title of usualSections) after = commands.insert('section', after, title) ?? after;
      });
    },
    /** The first section with an empty text, open for writing. */
    async writePurpose(): Promise<void> {
      const head = commands.insert('section', null, usualSections[0]);
      const text = commands.insert('text', head ?? null, '');
      await nextTick();
      if (text !== undefined) commands.write(text);
    },
  };
}
