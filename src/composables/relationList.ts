import {
  expressionLatex,
  findRelation,
  listFamilies,
  listRelations,
  rankRelations,
  readRelation,
  resolveUnit,
  symbolLatex,
  type CatalogueEntry,
  type Geometry,
  type Relation,
  type RelationCellResult,
  type RangeGrade,
  type RelationFamily,
  type ValidityResult,
} from '#engine';
import { foldForSearch } from './searchText';

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
  const text = foldForSearch(
    [relation.title, relation.authors, relation.year, relation.source, family.title, relation.wallCondition].join(' '),
  );
  return words.every((word) => text.includes(word));
}

function unranked({ relation, family }: CatalogueEntry): RelationCandidate {
  return { relation, family, grade: 'unchecked', validity: [], output: undefined };
}

/**
 * What the store offers for a geometry and words. With values at hand: what gives the same output
 * first, of these what is inside every stated range, then by stated accuracy.
 */
export function findCandidates(
  wanted: { geometry: Geometry | undefined; words: string; output: string | undefined },
  values: ReadonlyMap<string, number>,
): RelationCandidate[] {
  const { geometry } = wanted;
  const other = ({ relation }: RelationCandidate) => Number(relation.output.symbol !== wanted.output);
  const words = foldForSearch(wanted.words).split(/\s+/).filter(Boolean);
  const candidates: RelationCandidate[] =
    values.size === 0
      ? listRelations()
          .filter(({ family }) => geometry === undefined || family.geometry === geometry)
          .map(unranked)
      : rankRelations({ geometry }, values).sort((a, b) => other(a) - other(b));
  return candidates.filter(({ relation, family }) => matches(relation, family, words));
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
