import type { Diagnostic, Span } from '../../errors/diagnostic';
import { evaluationDiagnostic } from '../../errors/evaluation-errors';
import { resolveUnit } from '../../units/resolve';
import { findFunction } from '../functions';
import { nearest } from './nearest';
import type { Reach } from './types';

/** So many values of a cell are named to whoever asks it for one that it has not. */
const namedMembers = 6;

/** What a word is beside a name, in a sentence: a unit without its number, a function without its argument. */
function otherMeaning(name: string): string {
  if (findFunction(name) !== undefined) return ` ${name} is a function: write ${name}(…).`;
  return resolveUnit(name) === undefined ? '' : ` As a unit ${name} stands directly behind a number: 1 ${name}.`;
}

function proposal(near: string | undefined, span: Span) {
  if (near === undefined) return { hint: '', mend: undefined };
  return { hint: ` Nearest: ${near}.`, mend: { label: `Take ${near}`, span, insert: near } };
}

function unknownMember(object: string, property: string, span: Span, reach: Reach): Diagnostic {
  const members = [...reach.keysOf(object)].map((key) => key.slice(object.length + 1));
  const near = nearest(property, members);
  const { hint, mend } = proposal(near === undefined ? undefined : `${object}.${near}`, span);
  if (mend !== undefined) return evaluationDiagnostic('UNKNOWN_MEMBER', span, { object, property, hint }, mend);
  const list = members.slice(0, namedMembers).join(', ');
  const offered =
    list === '' ? ' It is one value by itself.' : ` It has ${list}${members.length > namedMembers ? ' …' : '.'}`;
  return evaluationDiagnostic('UNKNOWN_MEMBER', span, { object, property, hint: offered });
}

/** Why a name stands for no value, with the nearest name that does and a mend. */
export function unknownName(
  found: 'unknown' | 'several',
  name: string,
  property: string | undefined,
  span: Span,
  reach: Reach,
): Diagnostic {
  if (found === 'several') {
    const [first] = reach.keysOf(name);
    return evaluationDiagnostic('NAME_OF_SEVERAL', span, { name, example: first ?? `${name}.…` });
  }
  const names = [...reach.names()];
  if (property !== undefined && names.includes(name)) return unknownMember(name, property, span, reach);
  if (property !== undefined)
    return evaluationDiagnostic('UNKNOWN_NAME', span, { name: `${name}.${property}`, hint: '' });
  const { hint, mend } = proposal(nearest(name, names), span);
  return evaluationDiagnostic('UNKNOWN_NAME', span, { name, hint: hint + otherMeaning(name) }, mend);
}
