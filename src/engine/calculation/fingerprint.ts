import { digest } from 'lib0/hash/sha256';
import { formatExpression, partsOf, type Expression, type Line } from '../language/index';
import type { CalculationSettings, CellInput } from './types';

/** UTF-8 without a platform's encoder: lone surrogates become U+FFFD as there. */
function utf8(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length * 3);
  let length = 0;
  for (let index = 0; index < text.length; index += 1) {
    let code = text.codePointAt(index) ?? 0;
    if (code > 0xffff) index += 1;
    if (code >= 0xd800 && code <= 0xdfff) code = 0xfffd;
    if (code < 0x80) bytes[length++] = code;
    else {
      if (code < 0x800) bytes[length++] = 0xc0 | (code >> 6);
      else {
        if (code < 0x10000) bytes[length++] = 0xe0 | (code >> 12);
        else {
          bytes[length++] = 0xf0 | (code >> 18);
          bytes[length++] = 0x80 | ((code >> 12) & 63);
        }
        bytes[length++] = 0x80 | ((code >> 6) & 63);
      }
      bytes[length++] = 0x80 | (code & 63);
    }
  }
  return bytes.subarray(0, length);
}

const hexadecimal = Array.from({ length: 256 }, (_, byte) => byte.toString(16).padStart(2, '0'));

/** SHA-256 of a text, in hexadecimal. */
export function sha256(text: string): string {
  let result = '';
  for (const byte of digest(utf8(text))) result += hexadecimal[byte] ?? '';
  return result;
}

function sayingOfLine(line: Line, source: string): string | undefined {
  if (line.expression === undefined && line.diagnostics.length === 0) return undefined;
  // A line that cannot be read counts as it is written.
  if (line.diagnostics.some((diagnostic) => diagnostic.severity === 'error'))
    return source.slice(line.span.from, line.span.to);
  const target = line.target === undefined ? '' : ` to ${line.target.unit.display}`;
  const expression = line.expression === undefined ? '' : formatExpression(line.expression);
  return `${line.kind} ${line.name ?? ''} = ${expression}${target}`;
}

/** What a cell says, without notes, layout and place: its lines as they are read, and the settings that compute. */
export function sayingOf(cell: CellInput, lines: readonly Line[]): string {
  const { name, substance, mode, relation, keepReason, tbv } = cell.settings;
  const settings = [name, substance, mode, relation, keepReason, tbv].map((setting) => setting ?? '').join('|');
  const content =
    cell.kind === 'section' || cell.kind === 'text'
      ? cell.source.trim()
      : lines.flatMap((line) => sayingOfLine(line, cell.source) ?? []).join('\n');
  return `${cell.kind}|${settings}|${content}`;
}

function writesGauge(expression: Expression): boolean {
  if (expression.type === 'number') return expression.unit?.unit.level === 'gauge pressure';
  return partsOf(expression).some(writesGauge);
}

/** Whether what the lines say hangs on ambient pressure: a gauge unit stands in one of them. */
export function countsFromAmbient(lines: readonly Line[]): boolean {
  return lines.some(({ expression }) => expression !== undefined && writesGauge(expression));
}

/** The hash that a tick stands for. */
export function fingerprintOf(
  saying: string,
  fromAmbient: boolean,
  settings: CalculationSettings,
  dependsOn: Readonly<Record<string, string>>,
  ownValues: readonly string[],
): string {
  const ambient = fromAmbient ? settings.ambientPressure : null;
  return sha256(JSON.stringify([saying, ambient, dependsOn, ownValues]));
}
