import { digest } from 'lib0/hash/sha256';
import { formatExpression, readLines } from '../language/index';
import type { CellInput } from './types';

/** UTF-8 without a platform's encoder: lone surrogates become U+FFFD as there. */
function utf8(text: string): Uint8Array {
  const bytes: number[] = [];
  for (const sign of text) {
    let code = sign.codePointAt(0) ?? 0;
    if (code >= 0xd800 && code <= 0xdfff) code = 0xfffd;
    if (code < 0x80) bytes.push(code);
    else if (code < 0x800) bytes.push(0xc0 | (code >> 6), 0x80 | (code & 63));
    else if (code < 0x10000) bytes.push(0xe0 | (code >> 12), 0x80 | ((code >> 6) & 63), 0x80 | (code & 63));
    else bytes.push(0xf0 | (code >> 18), 0x80 | ((code >> 12) & 63), 0x80 | ((code >> 6) & 63), 0x80 | (code & 63));
  }
  return Uint8Array.from(bytes);
}

/** SHA-256 of a text, in hexadecimal. */
export function sha256(text: string): string {
  return [...digest(utf8(text))].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}

/**
 * What a cell says, without notes, layout and place: lines as they are read, settings that compute.
 * A line that cannot be read counts as it is written.
 */
export function sayingOf(cell: CellInput): string {
  const { name, substance, mode, relation, keepReason, tbv } = cell.settings;
  const settings = [name, substance, mode, relation, keepReason, tbv].map((setting) => setting ?? '').join('|');
  if (cell.kind === 'section' || cell.kind === 'text') return `${cell.kind}|${settings}|${cell.source.trim()}`;
  const lines = readLines(cell.source).flatMap((line) => {
    if (line.expression === undefined && line.diagnostics.length === 0) return [];
    if (line.diagnostics.some((diagnostic) => diagnostic.severity === 'error'))
      return [cell.source.slice(line.span.from, line.span.to)];
    const target = line.target === undefined ? '' : ` to ${line.target.unit.display}`;
    return [
      `${line.kind} ${line.name ?? ''} = ${line.expression === undefined ? '' : formatExpression(line.expression)}${target}`,
    ];
  });
  return `${cell.kind}|${settings}|${lines.join('\n')}`;
}
