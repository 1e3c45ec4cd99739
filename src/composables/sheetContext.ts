import { inject, provide, type InjectionKey, type Ref } from 'vue';
import type { Awareness } from 'y-protocols/awareness';
import type * as Y from 'yjs';
import type { Act, Remark, Tick } from '#contract';
import type { CellInput, CellKind, CellResult, CellSettings, NamedValue } from '#engine';

/** A cell in sheet order with its number (`3.2`) and, when marked, the number of its item to be verified. */
export interface SheetCell extends CellInput {
  number: string;
  tbvNumber: number | undefined;
}

export type TickState = 'ticked' | 'changed' | 'none';

/** Somebody at the sheet, the person at this screen included. */
export interface PersonHere {
  key: string;
  name: string;
  initials: string;
  /** 0 for oneself, 1 to 4 for others: which hand colour. */
  hand: number;
  me: boolean;
  cellId: string | undefined;
  writing: boolean;
}

/** What can be done with cells; every command checks access itself, so that keys and menus may simply call. */
export interface SheetCommands {
  focus(id: string): void;
  write(id: string): void;
  leave(): void;
  openPen(after: string | null): void;
  closePen(): void;
  insert(kind: CellKind, after: string | null, source?: string, settings?: CellSettings): string | undefined;
  move(id: string, by: -1 | 1): void;
  moveAfter(id: string, after: string | null): void;
  duplicate(id: string): void;
  remove(id: string): void;
  setSetting<K extends keyof CellSettings>(id: string, key: K, value: CellSettings[K]): void;
  replaceSource(id: string, from: number, to: number, text: string): void;
  markToVerify(id: string): void;
  chooseRelation(id: string): void;
  insertName(name: string): void;
  askRemark(id: string): void;
  toggleTick(id: string): void;
}

/** What editors need of the shared document. */
export interface SharedText {
  textOf(id: string): Y.Text | undefined;
  awareness: Awareness | undefined;
  undoManager: Y.UndoManager | undefined;
}

/** What the parts of the sheet share. */
export interface SheetContext {
  letter: Readonly<Ref<string>>;
  cells: Readonly<Ref<readonly SheetCell[]>>;
  results: Readonly<Ref<ReadonlyMap<string, CellResult>>>;
  names: Readonly<Ref<readonly NamedValue[]>>;
  acts: Readonly<Ref<ReadonlySet<Act>>>;
  /** Whether content can be written at this moment. */
  writable: Readonly<Ref<boolean>>;
  /** The engine has worked for longer than 0.3 s. */
  working: Readonly<Ref<boolean>>;
  /** Ids of cells whose content differs from the revision before. */
  changed: Readonly<Ref<ReadonlySet<string>>>;
  people: Readonly<Ref<readonly PersonHere[]>>;
  focusedId: Readonly<Ref<string | undefined>>;
  writingId: Readonly<Ref<string | undefined>>;
  /** Cells that the pointed-at cell uses, and those that follow from it. */
  traced: Readonly<Ref<{ uses: ReadonlySet<string>; follows: ReadonlySet<string> }>>;
  remarks: Readonly<Ref<readonly Remark[]>>;
  ticks: Readonly<Ref<ReadonlyMap<string, Tick>>>;
  tickStateOf(id: string): TickState;
  /** Sentences: what a lapsed tick stood for and what is there now. */
  changesSinceTick(id: string): string[];
  cellOfName(name: string): SheetCell | undefined;
  /** Marks what a cell uses and what follows from it; `pin` holds the marks. */
  point(id: string | undefined, pin?: boolean): void;
  /** The focus has come to a cell by itself. */
  attend(id: string): void;
  commands: SheetCommands;
  shared: SharedText;
  /** The editor that is open at this screen, so that pressed names can be put into it. */
  registerEditor(insert: ((text: string) => void) | undefined): void;
}

const key: InjectionKey<SheetContext> = Symbol('sheet');

export function provideSheet(context: SheetContext): void {
  provide(key, context);
}

/** The sheet that a component stands on. */
export function useSheetContext(): SheetContext {
  const context = inject(key);
  if (context === undefined) throw new Error('this component stands only on a sheet');
  return context;
}

export { key as sheetKey };
