import { Annotation, RangeSet, type EditorState, type Extension, type Range } from '@codemirror/state';
import {
  Decoration,
  ViewPlugin,
  WidgetType,
  type DecorationSet,
  type EditorView,
  type ViewUpdate,
} from '@codemirror/view';
import type { Awareness } from 'y-protocols/awareness';
import * as Y from 'yjs';
import { handOf } from './usePeopleHere';

/** Said to the editor when somebody else's caret moved. */
const caretsMoved = Annotation.define<boolean>();

interface Caret {
  id: string;
  name: string;
  anchor: number;
  head: number;
}

class CaretWidget extends WidgetType {
  constructor(
    readonly hand: number,
    readonly name: string,
    /** Text follows on the line: the flag stands above it instead of on it. */
    readonly within: boolean,
  ) {
    super();
  }
  override eq(other: CaretWidget): boolean {
    return other.hand === this.hand && other.name === this.name && other.within === this.within;
  }
  override toDOM(): HTMLElement {
    const caret = document.createElement('span');
    caret.className = `remote-caret hand-${this.hand}`;
    caret.setAttribute('aria-hidden', 'true');
    const flag = document.createElement('span');
    flag.className = `remote-caret__flag hand-${this.hand}${this.within ? ' remote-caret__flag--above' : ''}`;
    flag.textContent = this.name;
    caret.append(flag);
    return caret;
  }
  override ignoreEvent(): boolean {
    return true;
  }
}

/** Index of a relative position as it came from another browser; undefined when it is in another text, or none. */
function indexIn(text: Y.Text, given: unknown): number | undefined {
  if (text.doc === null || typeof given !== 'object' || given === null) return undefined;
  try {
    const position = Y.createAbsolutePositionFromRelativePosition(Y.createRelativePositionFromJSON(given), text.doc);
    return position?.type === text ? position.index : undefined;
  } catch {
    return undefined;
  }
}

function caretsIn(text: Y.Text, awareness: Awareness): Caret[] {
  return [...awareness.getStates()].flatMap(([client, state]): Caret[] => {
    if (client === awareness.clientID) return [];
    const { cursor, user } = state as {
      cursor?: { anchor?: unknown; head?: unknown } | null;
      user?: { id?: unknown; name?: unknown };
    };
    const anchor = indexIn(text, cursor?.anchor);
    const head = indexIn(text, cursor?.head);
    if (anchor === undefined || head === undefined || typeof user?.id !== 'string') return [];
    return [{ id: user.id, name: typeof user.name === 'string' ? user.name : '', anchor, head }];
  });
}

function decorate(carets: readonly Caret[], { doc }: EditorState): DecorationSet {
  const { length } = doc;
  const ranges = carets.flatMap(({ id, name, anchor, head }): Range<Decoration>[] => {
    const hand = handOf(id);
    const at = Math.min(head, length);
    const from = Math.min(anchor, head, length);
    const to = Math.min(Math.max(anchor, head), length);
    const widget = Decoration.widget({
      widget: new CaretWidget(hand, name, at < doc.lineAt(at).to),
      side: head > anchor ? -1 : 1,
    });
    const selection = Decoration.mark({ class: `remote-selection remote-selection--${hand}` });
    return [...(from < to ? [selection.range(from, to)] : []), widget.range(at)];
  });
  return Decoration.set(ranges, true);
}

/**
 * Carets and selections of others in a shared text, in their hand colours, and the telling of one's
 * own. Colours are classes: nothing that another browser sends becomes a style.
 */
export function remoteCarets(text: Y.Text, awareness: Awareness, tells: boolean): Extension {
  class RemoteCarets {
    decorations: DecorationSet = RangeSet.empty;
    private readonly onChange = ({ added, updated, removed }: Record<'added' | 'updated' | 'removed', number[]>) => {
      if ([...added, ...updated, ...removed].some((client) => client !== awareness.clientID))
        this.view.dispatch({ annotations: [caretsMoved.of(true)] });
    };

    constructor(private readonly view: EditorView) {
      awareness.on('change', this.onChange);
      this.decorations = decorate(caretsIn(text, awareness), view.state);
    }
    update(update: ViewUpdate): void {
      if (tells && update.view.hasFocus && (update.selectionSet || update.docChanged || update.focusChanged))
        this.tell(update.view);
      this.decorations = decorate(caretsIn(text, awareness), update.state);
    }
    private tell(view: EditorView): void {
      const { anchor, head } = view.state.selection.main;
      awareness.setLocalStateField('cursor', {
        anchor: Y.createRelativePositionFromTypeIndex(text, Math.min(anchor, text.length)),
        head: Y.createRelativePositionFromTypeIndex(text, Math.min(head, text.length)),
      });
    }
    destroy(): void {
      awareness.off('change', this.onChange);
      if (tells) awareness.setLocalStateField('cursor', null);
    }
  }
  return ViewPlugin.fromClass(RemoteCarets, { decorations: (plugin) => plugin.decorations });
}
