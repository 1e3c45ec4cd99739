import type { Expression } from './tree';

/** The expression as text in the language; reading it again gives the same tree. */
export function formatExpression(expression: Expression): string {
  switch (expression.type) {
    case 'number': {
      const unit = expression.unit === undefined ? '' : ` ${expression.unit.unit.text}`;
      const { uncertainty } = expression;
      if (uncertainty === undefined) return expression.text + unit;
      const amount =
        uncertainty.text ?? (uncertainty.relative ? `${uncertainty.value * 100} %` : `${uncertainty.value}${unit}`);
      return `${expression.text}${unit} ± ${amount}`;
    }
    case 'name':
      return expression.name;
    case 'member':
      return `${expression.object}.${expression.property}`;
    case 'group':
      return `(${formatExpression(expression.inner)})`;
    case 'unary':
      return `${expression.operator === 'not' ? 'not ' : expression.operator}${formatExpression(expression.operand)}`;
    case 'binary': {
      const tight = expression.operator === '*' || expression.operator === '/' || expression.operator === '^';
      // A literal's unit would take in what follows a bare sign: the space keeps them apart in reading, the rule in parsing.
      const sign = tight ? expression.operator : ` ${expression.operator} `;
      return formatExpression(expression.left) + sign + formatExpression(expression.right);
    }
    case 'comparison':
      return expression.operands
        .map(
          (operand, index) =>
            (index === 0 ? '' : ` ${expression.operators[index - 1] ?? ''} `) + formatExpression(operand),
        )
        .join('');
    case 'logical':
      return `${formatExpression(expression.left)} ${expression.operator} ${formatExpression(expression.right)}`;
    case 'call':
      return `${expression.name}(${expression.arguments.map(formatExpression).join(', ')})`;
    case 'missing':
      return '';
  }
}
