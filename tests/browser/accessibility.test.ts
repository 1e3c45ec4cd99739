import AxeBuilder from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openStage, type Stage } from '../helpers/browser';

/** axe 4 with the rules of WCAG 2.0, 2.1 and 2.2, levels A and AA. */
const standards = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
const phone = { width: 390, height: 844 };

let stage: Stage;
let calculation = '';
let project = '';
beforeAll(async () => {
  stage = await openStage();
  const page = await stage.enter('engineer');
  const [first] = (await (await page.request.get('/api/projects')).json()) as { id: string }[];
  project = first?.id ?? '';
  const [row] = (await (await page.request.get(`/api/projects/${project}/calculations`)).json()) as {
    calculationId: string;
  }[];
  calculation = row?.calculationId ?? '';
  await page.context().close();
});
afterAll(() => stage.close());

async function violations(page: Page): Promise<string[]> {
  await page.locator('h1').first().waitFor();
  // The last parts of a page are laid out a moment after it is there: results, fonts, lists.
  await page.waitForTimeout(1500);
  const { violations: found } = await new AxeBuilder({ page }).withTags(standards).analyze();
  return found.map(
    (violation) =>
      `${violation.id}: ${violation.nodes
        .map((node) => node.target.join(' '))
        .slice(0, 3)
        .join(', ')}`,
  );
}

const pages = (): [name: string, path: string][] => [
  ['projects', '/projects'],
  ['register', `/projects/${project}`],
  ['trail', `/projects/${project}/trail`],
  ['sheet', `/calculations/${calculation}`],
  ['report', `/calculations/${calculation}/A/report`],
  ['fluids', '/fluids'],
  ['relations', '/relations'],
  ['one relation', '/relations/gnielinski-1976-tube'],
  ['account', '/account'],
  ['no such page', '/nothing/here'],
];

describe('axe finds nothing', () => {
  it('on the sign-in page', async () => {
    const context = await stage.browser.newContext({ baseURL: stage.origin });
    const page = await context.newPage();
    await page.goto('/sign-in');
    expect(await violations(page)).toEqual([]);
    await context.close();
  });

  it.each([
    ['on the desk', undefined],
    ['on the phone', phone],
  ])('on any page %s', async (_where, size) => {
    const page = await stage.enter('engineer', size);
    const found: [string, string[]][] = [];
    for (const [name, path] of pages()) {
      await page.goto(path);
      const here = await violations(page);
      if (here.length > 0) found.push([name, here]);
    }
    expect(found).toEqual([]);
    await page.context().close();
  });

  it('on the administrator’s page of people, and in the dark', async () => {
    const page = await stage.enter('administrator');
    await page.goto('/people');
    expect(await violations(page)).toEqual([]);
    const engineer = await stage.enter('engineer');
    await engineer.emulateMedia({ colorScheme: 'dark' });
    await engineer.goto(`/calculations/${calculation}`);
    expect(await violations(engineer)).toEqual([]);
    await page.context().close();
    await engineer.context().close();
  });
});
