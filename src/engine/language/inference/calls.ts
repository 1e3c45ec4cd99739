import { evaluationDiagnostic } from '../../errors/evaluation-errors';
import { isDimensionless, powerOfDimension, sameDimension } from '../../units/dimension';
import { findFunction, functionSignatures, type FunctionSignature } from '../functions';
import type { CallNode } from '../tree';
import { describe } from './describe';
import { addLevels, sameLevels, sharedLevels } from './levels';
import { nearest } from './nearest';
import { plain } from './plain';
import type { Context, Inferred } from './types';

function unknownFunction(context: Context, node: CallNode): undefined {
  const span = node.nameSpan;
  if (node.name === 'log') {
    context.report(evaluationDiagnostic('LOG', span, {}, { label: 'Write ln', span, insert: 'ln' }));
    return undefined;
  }
  const names = functionSignatures.map((signature) => signature.name);
  const near = nearest(node.name, names);
  const hint = near === undefined ? '' : ` Nearest: ${near}.`;
  const mend = near === undefined ? undefined : { label: `Write ${near}`, span, insert: near };
  context.report(evaluationDiagnostic('UNKNOWN_FUNCTION', span, { name: node.name, hint }, mend));
  return undefined;
}

function wrongCount(context: Context, node: CallNode, signature: FunctionSignature): undefined {
  const count = node.arguments.length;
  const parameters = {
    name: node.name,
    parameters: signature.parameters.join(', '),
    count: count === 0 ? 'no value is' : count === 1 ? '1 value is' : `${count} values are`,
  };
  context.report(evaluationDiagnostic('ARGUMENTS', node.span, parameters));
  return undefined;
}

/** A call of a function, `if` among them. */
export function callOf(context: Context, node: CallNode): Inferred | undefined {
  const signature = findFunction(node.name);
  const types = node.arguments.map((argument) => context.infer(argument));
  if (signature === undefined) return unknownFunction(context, node);
  if (types.length < signature.least || types.length > signature.most) return wrongCount(context, node, signature);
  const given = types.filter((type) => type !== undefined);
  if (given.length < types.length) return undefined;
  if (signature.rule === 'if') return branchesOf(context, node, given);
  const wrong = given.findIndex((type) => type.kind === 'condition');
  if (wrong >= 0) {
    const span = node.arguments[wrong]?.span ?? node.span;
    context.report(evaluationDiagnostic('ARGUMENT_CONDITION', span, { name: node.name }));
    return undefined;
  }
  switch (signature.rule) {
    case 'plain':
      return plainCall(context, node, given);
    case 'root2':
    case 'root3':
      return rootOf(context, node, given, signature.rule === 'root2' ? 2 : 3);
    default:
      return alike(context, node, given, signature.rule);
  }
}

function plainCall(context: Context, node: CallNode, given: readonly Inferred[]): Inferred | undefined {
  const wrong = given.findIndex((type) => !isDimensionless(type.dimension));
  const type = given[wrong];
  if (type === undefined) return plain();
  const span = node.arguments[wrong]?.span ?? node.span;
  context.report(evaluationDiagnostic('ARGUMENT_UNITS', span, { name: node.name, given: describe(type) }));
  return undefined;
}

function rootOf(context: Context, node: CallNode, [given]: readonly Inferred[], root: 2 | 3): Inferred | undefined {
  const span = node.arguments[0]?.span ?? node.span;
  if (given === undefined || context.settle(given, span) === undefined) return undefined;
  const dimension = powerOfDimension(given.dimension, 1 / root);
  if (dimension !== undefined) return { kind: 'number', dimension, levels: 0 };
  context.report(evaluationDiagnostic('ROOT_UNITS', span, { given: describe(given) }));
  return undefined;
}

/** Functions of values of one kind: all dimensions alike, all levels or all differences. */
function alike(
  context: Context,
  node: CallNode,
  given: readonly Inferred[],
  rule: 'same' | 'sum' | 'mean',
): Inferred | undefined {
  const settled =
    rule === 'sum' ? given : given.map((type, index) => context.settle(type, node.arguments[index]?.span ?? node.span));
  const types = settled.filter((type) => type !== undefined);
  const [first] = types;
  if (first === undefined || types.length < given.length) return undefined;
  const other = disagreeing(types, rule);
  if (other !== undefined) {
    const parameters = { name: node.name, left: describe(other[0]), right: describe(other[1]) };
    context.report(evaluationDiagnostic('ARGUMENTS_DIFFER', node.span, parameters));
    return undefined;
  }
  const levels = types.map((type) => type.levels);
  const joined = levels.reduce((left, right) =>
    rule === 'sum' ? addLevels(left, right, 1) : sharedLevels(left, right),
  );
  return { kind: 'number', dimension: first.dimension, levels: node.name === 'abs' && joined === 1 ? 'any' : joined };
}

/** Two values that are not of one kind; in a sum levels and differences may stand side by side. */
function disagreeing(types: readonly Inferred[], rule: string): readonly [Inferred, Inferred] | undefined {
  for (const left of types) {
    const right = types.find(
      (type) =>
        !sameDimension(type.dimension, left.dimension) || (rule !== 'sum' && !sameLevels(type.levels, left.levels)),
    );
    if (right !== undefined) return [left, right];
  }
  return undefined;
}

function branchesOf(context: Context, node: CallNode, [test, yes, no]: readonly Inferred[]): Inferred | undefined {
  if (test === undefined || yes === undefined || no === undefined) return undefined;
  if (test.kind !== 'condition') {
    const span = node.arguments[0]?.span ?? node.span;
    context.report(evaluationDiagnostic('IF_CONDITION', span, { given: describe(test) }));
    return undefined;
  }
  const left = context.settle(yes, node.arguments[1]?.span ?? node.span);
  const right = context.settle(no, node.arguments[2]?.span ?? node.span);
  if (left === undefined || right === undefined) return undefined;
  const alikeBranches =
    left.kind === right.kind && sameDimension(left.dimension, right.dimension) && sameLevels(left.levels, right.levels);
  if (!alikeBranches) {
    const sides = { left: describe(left), right: describe(right) };
    context.report(evaluationDiagnostic('BRANCHES_DIFFER', node.span, sides));
    return undefined;
  }
  return { ...left, levels: sharedLevels(left.levels, right.levels), constant: undefined };
}
