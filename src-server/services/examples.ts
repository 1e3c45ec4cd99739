import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { ExampleEntry } from '#contract';
import { exchangeSchema, type ExchangeCalculation } from '#document';
import { notFound } from '../errors/index';

const folder = 'examples';

/** The calculations that ship with the product, read once. */
const examples = new Map<string, ExchangeCalculation>();

function load(): Map<string, ExchangeCalculation> {
  if (examples.size > 0) return examples;
  for (const file of readdirSync(folder).filter((name) => name.endsWith('.json') && !name.endsWith('.results.json'))) {
    examples.set(
      file.replace(/\.json$/, ''),
      exchangeSchema.parse(JSON.parse(readFileSync(join(folder, file), 'utf8'))),
    );
  }
  return examples;
}

export function listExamples(): ExampleEntry[] {
  return [...load()].map(([id, { title, purpose = '' }]) => ({ id, title, purpose }));
}

export function exampleById(id: string): ExchangeCalculation {
  const example = load().get(id);
  if (example === undefined) throw notFound('example');
  return example;
}
