import {
  acceptCompletion,
  closeBrackets,
  closeCompletion,
  completionStatus,
  moveCompletionSelection,
  startCompletion,
} from '@codemirror/autocomplete';
import { defaultKeymap } from '@codemirror/commands';
import { bracketMatching, language, LanguageSupport, LRLanguage, syntaxHighlighting } from '@codemirror/language';
import { setDiagnostics, type Diagnostic as EditorDiagnostic } from '@codemirror/lint';
import { EditorState, Prec, type Extension } from '@codemirror/state';
import { drawSelection, EditorView, keymap, placeholder } from '@codemirror/view';
import { classHighlighter } from '@lezer/highlight';
import { yCollab, yUndoManagerKeymap } from 'y-codemirror.next';
import type { Awareness } from 'y-protocols/awareness';
import type * as Y from 'yjs';
import { calculationParser, type Diagnostic } from '#engine';
import { remoteCarets } from './remoteCarets';
import { completion, type Offers } from './sourceCompletion';

export type SourceKind = 'lines' | 'words' | 'title';

export interface SourceEditorOptions {
  parent: HTMLElement;
  text: Y.Text;
  awareness: Awareness | undefined;
  undoManager: Y.UndoManager | undefined;
  kind: SourceKind;
  readOnly: boolean;
  label: string;
  hint: string;
  offers(): Offers;
  /** Esc. */
  leave(): void;
  /** Ctrl+Enter; Enter in a section's title. */
  finish(): void;
}

const calculation = new LanguageSupport(LRLanguage.define({ name: 'wallflux', parser: calculationParser }));

/** CodeMirror puts its styles into a style element, which the policy lets in by this nonce. */
function nonce(): Extension {
  const meta = document.querySelector<HTMLMetaElement>('meta[property=csp-nonce]');
  return meta?.nonce ? EditorView.cspNonce.of(meta.nonce) : [];
}

function keysOf(options: SourceEditorOptions): Extension {
  const finish = () => {
    options.finish();
    return true;
  };
  return Prec.high(
    keymap.of([
      { key: 'Tab', run: acceptCompletion },
      { key: 'Ctrl-Space', run: startCompletion },
      { key: 'ArrowDown', run: moveCompletionSelection(true) },
      { key: 'ArrowUp', run: moveCompletionSelection(false) },
      {
        key: 'Escape',
        run: (view) => {
          if (completionStatus(view.state) !== null) return closeCompletion(view);
          options.leave();
          return true;
        },
      },
      { key: 'Mod-Enter', run: finish },
      ...(options.kind === 'title' ? [{ key: 'Enter', run: finish }] : []),
    ]),
  );
}

function linesSupport(options: SourceEditorOptions): Extension {
  if (options.kind !== 'lines') return [];
  return [
    calculation,
    syntaxHighlighting(classHighlighter),
    bracketMatching(),
    closeBrackets(),
    completion(options.offers),
    // Brackets close by themselves, except the quote, which is part of names here.
    calculation.language.data.of({ closeBrackets: { brackets: ['('] } }),
  ];
}

/** An editor bound to a shared text: carets of others, undo of one's own changes only. */
export function createSourceEditor(options: SourceEditorOptions): EditorView {
  const state = EditorState.create({
    doc: options.text.toJSON(),
    extensions: [
      nonce(),
      keysOf(options),
      keymap.of([...yUndoManagerKeymap, ...defaultKeymap]),
      drawSelection(),
      EditorView.lineWrapping,
      EditorView.contentAttributes.of({
        'aria-label': options.label,
        spellcheck: options.kind === 'lines' ? 'false' : 'true',
      }),
      options.hint === '' ? [] : placeholder(options.hint),
      options.readOnly ? [EditorState.readOnly.of(true), EditorView.editable.of(false)] : [],
      linesSupport(options),
      yCollab(options.text, null, { undoManager: options.undoManager ?? false }),
      options.awareness === undefined ? [] : remoteCarets(options.text, options.awareness, !options.readOnly),
    ],
  });
  return new EditorView({ state, parent: options.parent });
}

/** Shows diagnostics at their places; spans that a newer text has outgrown are cut. */
export function showDiagnostics(view: EditorView, diagnostics: readonly Diagnostic[]): void {
  if (view.state.facet(language) === null) return;
  const length = view.state.doc.length;
  const marks = diagnostics.flatMap((diagnostic): EditorDiagnostic[] => {
    if (diagnostic.span === undefined || diagnostic.span.from > length) return [];
    const from = diagnostic.span.from;
    const to = Math.min(Math.max(diagnostic.span.to, from), length);
    const { mend } = diagnostic;
    return [
      {
        from,
        to,
        severity: diagnostic.severity,
        message: diagnostic.message,
        actions:
          mend === undefined
            ? []
            : [
                {
                  name: mend.label,
                  apply: (target) =>
                    target.dispatch({ changes: { from: mend.span.from, to: mend.span.to, insert: mend.insert } }),
                },
              ],
      },
    ];
  });
  view.dispatch(setDiagnostics(view.state, marks));
}
