export interface KeyGroup {
  title: string;
  /** `letters`: single letters, which can be switched off. */
  letters?: true;
  keys: readonly { keys: readonly string[]; does: string }[];
}

/** What the list of keys shows. The keys themselves act where their pages bind them. */
export const keyGroups: readonly KeyGroup[] = [
  {
    title: 'Anywhere',
    keys: [
      { keys: ['F1'], does: 'this list' },
      { keys: ['F6', 'Shift+F6'], does: 'next, previous region: spine, contents, head, work, title block' },
      { keys: ['Ctrl+P'], does: 'print the report, not the screen' },
      { keys: ['Esc'], does: 'close the topmost thing' },
    ],
  },
  {
    title: 'In the register',
    keys: [
      { keys: ['Up', 'Down'], does: 'previous, next calculation' },
      { keys: ['Home', 'End'], does: 'first, last calculation' },
      { keys: ['Enter'], does: 'open it' },
      { keys: ['Ctrl+F'], does: 'find' },
    ],
  },
  {
    title: 'At a cell of a sheet',
    keys: [
      { keys: ['Up', 'Down'], does: 'previous, next cell' },
      { keys: ['Ctrl+Up', 'Ctrl+Down'], does: 'previous, next section' },
      { keys: ['Enter'], does: 'write; Esc leaves writing' },
      { keys: ['Ctrl+Enter'], does: 'finish and open the line below' },
      { keys: ['Insert'], does: 'pen line below' },
      { keys: ['Alt+Up', 'Alt+Down'], does: 'move the cell' },
      { keys: ['Ctrl+Z', 'Ctrl+Shift+Z'], does: 'undo, redo one’s own changes only' },
      { keys: ['Ctrl+F'], does: 'find in this sheet' },
    ],
  },
  {
    title: 'Letters at a cell',
    letters: true,
    keys: [
      { keys: ['M'], does: 'remark' },
      { keys: ['V'], does: 'to be verified' },
      { keys: ['K'], does: 'tick' },
      { keys: ['N', 'Shift+N'], does: 'next, previous open item' },
    ],
  },
];
