import { findUnit, unitNames } from './table';
import { resolveUnit } from './resolve';
import { scanFactors } from './scan';

/** Common slips and what is meant by them. */
const slips: Readonly<Record<string, string>> = {
  sec: 's',
  secs: 's',
  mins: 'min',
  hrs: 'h',
  Kg: 'kg',
  KG: 'kg',
  kgs: 'kg',
  gr: 'g',
  gm: 'g',
  lbs: 'lb',
  feet: 'ft',
  inches: 'in',
  degK: 'K',
  '°K': 'K',
  deg_C: 'degC',
  deg_F: 'degF',
  degrees: 'deg',
  celcius: 'degC',
  Celsius: 'degC',
  Fahrenheit: 'degF',
  KW: 'kW',
  Kw: 'kW',
  Kwh: 'kWh',
  KWh: 'kWh',
  KJ: 'kJ',
  KPa: 'kPa',
  Kpa: 'kPa',
  Nm: 'N m',
  mPas: 'mPa s',
  Pas: 'Pa s',
  sqm: 'm^2',
  cbm: 'm^3',
  cum: 'm^3',
  m3h: 'm^3/h',
  usgpm: 'gpm',
  USgpm: 'gpm',
  Mbar: 'mbar',
  tons: 't',
  ton: 't',
  kts: 'kn',
  pct: '%',
  $: 'USD',
  dollar: 'USD',
  euro: 'EUR',
  euros: 'EUR',
  years: 'yr',
};

/** Units that are refused since the trade reads them in two ways. */
const refused: Readonly<Record<string, string>> = {
  MBTU: 'MBTU is a thousand BTU to some and a million to others; write kBTU or MMBTU',
  MBtu: 'MBtu is a thousand Btu to some and a million to others; write kBtu or MMBtu',
  Nm3: 'Nm3 is an amount of gas, not a volume; give a mass flow, or a volume in m^3 with its state',
  scf: 'scf is an amount of gas, not a volume; give a mass, or a volume in ft^3 with its state',
  scfm: 'scfm is an amount of gas, not a volume flow; give a mass flow, or a flow in cfm with its state',
  mpa: 'mpa may be mPa or MPa; write the one that is meant',
  mw: 'mw may be mW or MW; write the one that is meant',
  mj: 'mj may be mJ or MJ; write the one that is meant',
  ton: 'ton is a mass of 1 000 kg (t), 2 000 lb (ton_short) or 2 240 lb (ton_long), or of refrigeration (TR)',
};

/** Number of single-character edits between two words (Levenshtein 1966). */
export function editDistance(left: string, right: string): number {
  let row = [...Array(right.length + 1).keys()];
  for (let i = 1; i <= left.length; i += 1) {
    const next = [i];
    for (let j = 1; j <= right.length; j += 1) {
      const substitution = (row[j - 1] ?? 0) + (left[i - 1] === right[j - 1] ? 0 : 1);
      next.push(Math.min(substitution, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[right.length] ?? 0;
}

/** Own keys only, so that `constructor` is a word like any other. */
function lookUp(list: Readonly<Record<string, string>>, word: string): string | undefined {
  return Object.hasOwn(list, word) ? list[word] : undefined;
}

function singular(word: string): string | undefined {
  const found = /^(.{2,})s$/.exec(word)?.[1];
  if (found === undefined) return undefined;
  return findUnit(found.toLowerCase())?.definition.names[0] ?? findUnit(found)?.definition.names[0];
}

/** The unit name nearest to a word, for error sentences; undefined when none is near. */
export function nearestUnit(word: string): string | undefined {
  const slip = lookUp(slips, word) ?? singular(word);
  if (slip !== undefined) return slip;
  if (word.length < 2 || word.length > 16) return undefined;
  const lower = word.toLowerCase();
  let best: string | undefined;
  let least = word.length < 4 ? 1 : 2;
  for (const candidate of unitNames()) {
    if (Math.abs(candidate.length - word.length) >= least + 1) continue;
    const plain = candidate.toLowerCase();
    // A difference of case alone counts least; short words are near only by case.
    const distance = plain === lower ? 0.25 + editDistance(candidate, word) / 100 : editDistance(plain, lower);
    if (distance < least || (distance === least && best === undefined && word.length > 2 && least > 1)) {
      least = distance;
      best = candidate;
    }
  }
  return best;
}

/** Why a text is no unit: one sentence without a full stop, and the unit that is probably meant. */
export interface UnitProblem {
  word: string;
  sentence: string;
  suggestion?: string | undefined;
  /** The trade reads the word in two ways; it is not just unknown. */
  refused?: true;
}

/** What is wrong with a unit text that `resolveUnit` does not know; undefined when it does. */
export function unitProblem(text: string): UnitProblem | undefined {
  const trimmed = text.trim();
  if (resolveUnit(trimmed) !== undefined) return undefined;
  const words = trimmed.match(/[\p{L}°%‰′″€£℃℉][\p{L}\d_°₂€£]*/gu) ?? [];
  for (const word of words) {
    if (resolveUnit(word) !== undefined) continue;
    const reason = lookUp(refused, word);
    if (reason !== undefined) return { word, sentence: reason, refused: true };
    const suggestion = nearestUnit(word);
    const near = suggestion === undefined ? '' : `; ${suggestion} is`;
    return { word, sentence: `${word} is not a unit${near}`, suggestion };
  }
  if (words.some((word) => resolveUnit(word)?.level === 'gauge pressure')) {
    return { word: trimmed, sentence: 'a gauge pressure stands alone; in a product write the absolute unit' };
  }
  return { word: trimmed, sentence: `${trimmed} cannot be read as a unit` };
}

/** The same for a unit that begins a text and goes on to something else. */
export function unitProblemAt(text: string): UnitProblem | undefined {
  const scanned = scanFactors(text, 0);
  if (scanned !== undefined) return unitProblem(text.slice(0, scanned.end));
  const word = /^[\p{L}°%‰′″€£℃℉][\p{L}\d_°₂€£]*/u.exec(text)?.[0];
  return word === undefined ? undefined : unitProblem(word);
}
