import { computed, reactive, watch } from 'vue';
import { evaluateRelation, validityOf, type Relation, type ValidityResult } from '#engine';

/** A plain number as people write it: decimal point or comma, `1e5`, spaces between thousands. */
export function plainNumber(text: string): number | undefined {
  const tidy = text
    .replace(/[\s\u00a0]/g, '')
    .replace(',', '.')
    .replace('−', '-');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(tidy)) return undefined;
  const value = Number(tidy);
  return Number.isFinite(value) ? value : undefined;
}

/** `39 160`, `0.0231`, `1.63e7`: four figures, thousands parted. */
export function fourFigures(value: number): string {
  const size = Math.abs(value);
  const text =
    size !== 0 && (size >= 1e7 || size < 1e-4) ? value.toExponential(3) : String(Number(value.toPrecision(4)));
  const [whole = '', ...rest] = text.split('.');
  const parted = whole.includes('e') ? whole : whole.replace(/\B(?=(\d{3})+(?!\d))/g, '\u00a0');
  return [parted.replace('-', '−'), ...rest].join('.');
}

/** Works a stored relation with numbers written beside its symbols, in the symbols' units. */
export function useRelationTrial(relation: () => Relation | undefined) {
  const written = reactive<Record<string, string>>({});
  watch(relation, () => Object.keys(written).forEach((symbol) => delete written[symbol]));

  const values = computed(() => {
    const known = new Map<string, number>();
    for (const [symbol, text] of Object.entries(written)) {
      const value = plainNumber(text);
      if (value !== undefined) known.set(symbol, value);
    }
    return known;
  });
  const unreadable = computed(() =>
    Object.keys(written).filter((symbol) => (written[symbol] ?? '').trim() !== '' && !values.value.has(symbol)),
  );
  const outcome = computed(() => {
    const entry = relation();
    return entry === undefined ? undefined : evaluateRelation(entry, values.value);
  });
  const result = computed(() => (outcome.value?.ok === true ? fourFigures(outcome.value.value) : ''));
  /** Why there is no result, once every input has a number. */
  const reason = computed(() => {
    const complete = relation()?.inputs.every(({ symbol }) => values.value.has(symbol)) === true;
    return complete && outcome.value?.ok === false ? outcome.value.reason : '';
  });
  const validity = computed((): ValidityResult[] => {
    const entry = relation();
    if (entry === undefined) return [];
    const known =
      outcome.value?.ok === true
        ? new Map([...values.value, [entry.output.symbol, outcome.value.value] as const])
        : values.value;
    return validityOf(entry, known);
  });
  return { written, unreadable, result, reason, validity };
}
