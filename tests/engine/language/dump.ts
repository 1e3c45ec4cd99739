import type { Expression, Line } from '../../../src/engine/language/index';

/** An expression as a list with the operator first: `(/ 5[kW] Q_0)`; what is missing is `…`. */
export function dumpExpression(expression: Expression): string {
  const all = (parts: readonly Expression[]) => parts.map(dumpExpression).join(' ');
  switch (expression.type) {
    case 'number': {
      const unit = expression.unit === undefined ? '' : `[${expression.unit.unit.text}]`;
      const given = expression.uncertainty;
      const spread =
        given === undefined ? '' : `±${Number(given.value.toPrecision(12))}${given.relative ? ' of it' : ''}`;
      return `${expression.value}${unit}${spread}`;
    }
    case 'name':
      return expression.name;
    case 'member':
      return `${expression.object}.${expression.property}`;
    case 'group':
      return `{${dumpExpression(expression.inner)}}`;
    case 'unary':
      return `(${expression.operator} ${dumpExpression(expression.operand)})`;
    case 'binary':
    case 'logical':
      return `(${expression.operator} ${all([expression.left, expression.right])})`;
    case 'comparison':
      return `(${expression.operators.join(' ')} ${all(expression.operands)})`;
    case 'call':
      return [`${expression.name}(`, all(expression.arguments), ')'].join('');
    case 'missing':
      return '…';
  }
}

/** A line as a sentence, its diagnostics beneath it: code, severity, text at the place, and what the mend makes of the line. */
export function dumpLine(line: Line, source: string): string[] {
  const words: string[] = [line.kind];
  if (line.name !== undefined) words.push(line.name, '=');
  if (line.expression !== undefined) words.push(dumpExpression(line.expression));
  if (line.target !== undefined) words.push('to', `[${line.target.unit.text}]`);
  if (line.note !== undefined) words.push('#', line.note);
  const diagnostics = line.diagnostics.flatMap(({ severity, code, span, message, mend }) => {
    const place = span === undefined ? '' : ` at "${source.slice(span.from, span.to)}"`;
    const shown = [`  ${severity} ${code}${place}`, `    ${message}`];
    if (mend === undefined) return shown;
    const mended = source.slice(0, mend.span.from) + mend.insert + source.slice(mend.span.to);
    return [...shown, `    mended: ${mended.split('\n')[line.number] ?? ''}`];
  });
  return [words.join(' '), ...diagnostics];
}
