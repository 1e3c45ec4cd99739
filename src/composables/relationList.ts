import {
  evaluateRelation,
  expressionLatex,
  findRelation,
  listFamilies,
  readRelation,
  resolveUnit,
  symbolLatex,
  validityOf,
  worstGrade,
  type Geometry,
  type Relation,
  type RelationCellResult,
  type RangeGrade,
  type RelationFamily,
  type ValidityResult,
} from '#engine';

export interface RelationCandidate {
  relation: Relation;
  family: RelationFamily;
  /** With the values at hand; `unchecked` where they do not tell. */
  grade: RangeGrade;
  validity: ValidityResult[];
  /** The output with the values at hand, where they suffice. */
  output: number | undefined;
}

export function geometryOf(relationId: string | undefined): Geometry {
  return (relationId === undefined ? undefined : findRelation(relationId)?.family.geometry) ?? 'any';
}

/** Geometries that the catalogue has relations for, in the order of its families. */
export function geometriesInStore(): Geometry[] {
  return [...new Set(listFamilies().map((family) => family.geometry))];
}

/** Symbol → number in the symbol's unit, of a relation that stands on the sheet. */
export function valuesAtHand(relation: RelationCellResult | undefined): ReadonlyMap<string, number> {
  const values = new Map<string, number>();
  for (const input of relation?.inputs ?? []) {
    const si = input.value?.si;
    const unit = resolveUnit(input.unit);
    if (typeof si === 'number' && unit !== undefined) values.set(input.symbol, (si - unit.offset) / unit.factor);
  }
  return values;
}

function matches(relation: Relation, family: RelationFamily, words: readonly string[]): boolean {
  const text = [relation.title, relation.authors, relation.year, relation.source, family.title, relation.wallCondition]
    .join(' ')
    .toLowerCase();
  return words.every((word) => text.includes(word));
}

function outputOf(relation: Relation, values: ReadonlyMap<string, number>): number | undefined {
  if (!relation.inputs.every((input) => values.has(input.symbol))) return undefined;
  const outcome = evaluateRelation(relation, values);
  return outcome.ok ? outcome.value : undefined;
}

const rank: Readonly<Record<RangeGrade, number>> = { inside: 0, edge: 1, unchecked: 2, outside: 3 };

function judge(relation: Relation, family: RelationFamily, values: ReadonlyMap<string, number>): RelationCandidate {
  if (values.size === 0) return { relation, family, grade: 'unchecked', validity: [], output: undefined };
  const output = outputOf(relation, values);
  const all = output === undefined ? values : new Map([...values, [relation.output.symbol, output] as const]);
  const validity = validityOf(relation, all);
  return { relation, family, grade: worstGrade(validity.map((each) => each.grade)), validity, output };
}

/**
 * What the store offers for a geometry and words. With values at hand: what gives the same output
 * first, of these what is inside every stated range, then by stated accuracy.
 */
export function findCandidates(
  wanted: { geometry: Geometry | undefined; words: string; output: string | undefined },
  values: ReadonlyMap<string, number>,
): RelationCandidate[] {
  const words = wanted.words.toLowerCase().split(/\s+/).filter(Boolean);
  const candidates = listFamilies()
    .filter((family) => wanted.geometry === undefined || family.geometry === wanted.geometry)
    .flatMap((family) =>
      family.relations
        .filter((relation) => matches(relation, family, words))
        .map((relation) => judge(relation, family, values)),
    );
  if (values.size === 0) return candidates;
  const accuracy = (candidate: RelationCandidate) => candidate.relation.relativeAccuracy ?? Infinity;
  const other = (candidate: RelationCandidate) => Number(candidate.relation.output.symbol !== wanted.output);
  return candidates.sort(
    (a, b) =>
      other(a) - other(b) ||
      Number(a.output === undefined) - Number(b.output === undefined) ||
      rank[a.grade] - rank[b.grade] ||
      accuracy(a) - accuracy(b),
  );
}

/**
 * Source lines for a relation: bindings of symbols that it shares with the one before are kept,
 * others begin empty, and lines that are no bindings stay beneath it.
 */
export function bindingLines(relation: Relation, before: string, beforeId: string | undefined): string {
  const own = [...relation.inputs, ...relation.validitySymbols].map((symbol) => symbol.symbol);
  const old = beforeId === undefined ? undefined : findRelation(beforeId)?.relation;
  const oldSymbols = new Set(
    old === undefined ? [] : [...old.inputs, ...old.validitySymbols].map((symbol) => symbol.symbol),
  );
  const nameOf = (line: string) => /^\s*([\p{L}_][\p{L}\p{N}_']*)\s*=/u.exec(line)?.[1] ?? '';
  const lines = before.split('\n').filter((line) => line.trim() !== '');
  const bound = new Map(lines.map((line) => [nameOf(line), line]));
  const bindings = own.map((symbol) => bound.get(symbol) ?? `${symbol} = `);
  const beneath = lines.filter((line) => !own.includes(nameOf(line)) && !oldSymbols.has(nameOf(line)));
  return [...bindings, ...beneath].join('\n');
}

/** The formula lines of a relation as mathematics. */
export function formulaLatex(relation: Relation): string[] {
  return readRelation(relation).formula.map((line) =>
    line.kind === 'assignment'
      ? `${symbolLatex(line.symbol)} = ${expressionLatex(line.expression)}`
      : `${symbolLatex(line.symbol)}:\\ ${expressionLatex(line.equation)} = 0`,
  );
}

/** The result with the values at hand, to four figures: enough to compare. */
export function outputText({ relation, output }: RelationCandidate): string {
  if (output === undefined) return '';
  const figure = String(Number(output.toPrecision(4)));
  const [whole = '', decimals] = figure.replace('-', '−').split('.');
  const parted = whole.replace(/\B(?=(\d{3})+(?!\d))/g, '\u00a0') + (decimals === undefined ? '' : `.${decimals}`);
  return relation.output.unit === '1' ? parted : `${parted} ${relation.output.unit}`;
}
