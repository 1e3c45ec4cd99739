import { execFileSync } from 'node:child_process';
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { cell, openStage, passphrase, said, write, type Stage } from '../helpers/browser';

let stage: Stage;
let engineer: Page;
let second: Page;
let checker: Page;
let lead: Page;
let address = '';

beforeAll(async () => {
  stage = await openStage();
});
afterAll(() => stage.close());

const pen = (page: Page) => page.getByRole('textbox', { name: /^Pen line/ });
const dialog = (page: Page) => page.getByRole('dialog');

/** Writes a cell on the pen line below the last one; `number` is the number that it gets. */
async function penLine(page: Page, number: string, text: string): Promise<void> {
  if (number !== '0.1' && !(await pen(page).isVisible())) {
    await page.locator('article').last().focus();
    await page.keyboard.press('Insert');
  }
  await pen(page).fill(text);
  await pen(page).press('Enter');
  await cell(page, number).waitFor();
}

async function sign(page: Page, action: RegExp): Promise<void> {
  await dialog(page)
    .getByLabel(/Passphrase of/)
    .fill(passphrase);
  await dialog(page).getByRole('button', { name: action }).click();
  await dialog(page).waitFor({ state: 'detached' });
}

describe('the whole job, from an empty sheet to a printed, locked revision', () => {
  it('the engineer opens a calculation and writes it with live results', async () => {
    engineer = await stage.enter('engineer');
    await engineer
      .getByRole('link', { name: /Veldra Ness/ })
      .first()
      .click();
    await engineer.getByRole('button', { name: 'New calculation' }).click();
    await dialog(engineer).getByLabel('Title').fill('Duct of fan V-9, heat loss');
    await dialog(engineer).getByRole('button', { name: 'Begin' }).click();
    await engineer.waitForURL(/\/calculations\//);
    address = new URL(engineer.url()).pathname;
    await engineer.getByText('Nothing written yet').waitFor();
    await engineer.getByRole('button', { name: /Write a first line/ }).click();
    await penLine(engineer, '0.1', 'u = 3.2 m/s');
    await penLine(engineer, '0.2', 'D = 0.324 m');
    await penLine(engineer, '0.3', 'V_dot = u*pi*D^2/4 to m^3/h');
    await expect.poll(() => said(engineer, '0.3'), { timeout: 20_000 }).toContain('949.8');
    await engineer.getByText('all kept').waitFor();
  });

  it('a second engineer sees it at once, writes in the same cell, and both see the results', async () => {
    second = await stage.enter('second');
    await second.goto(address);
    await expect.poll(() => said(second, '0.3'), { timeout: 20_000 }).toContain('949.8');
    await write(second, '0.1', '\nw_2 = 2*u');
    await expect.poll(() => said(engineer, '0.1')).toContain('6.4');
    await write(engineer, '0.2', '\nL = 4.6 m');
    await expect.poll(() => said(second, '0.2')).toContain('4.6');
    await second.getByText('At the sheet now').waitFor();
    await expect.poll(() => engineer.getByText('T. Reinholt').first().isVisible()).toBe(true);
  });

  it('says what is wrong at its line, and the rest still computes', async () => {
    await write(engineer, '0.3', '\nA = D + u');
    await expect.poll(() => said(engineer, '0.3'), { timeout: 20_000 }).toMatch(/length.*velocity/s);
    expect(await said(engineer, '0.3')).toContain('949.8');
    await cell(engineer, '0.3').focus();
    await engineer.keyboard.press('Control+z');
    await expect.poll(() => said(engineer, '0.3'), { timeout: 20_000 }).not.toMatch(/velocity/);
  });

  it('what is written while the server is away arrives afterwards', async () => {
    await stage.stop();
    await engineer.getByText(/No line/).waitFor();
    await write(engineer, '0.1', '\nu_3 = 3*u');
    await expect.poll(() => said(engineer, '0.1')).toContain('9.6');
    await stage.startAgain();
    await expect.poll(() => said(second, '0.1'), { timeout: 30_000 }).toContain('9.6');
    await expect.poll(() => engineer.getByText('all kept').isVisible(), { timeout: 20_000 }).toBe(true);
  });

  it('the checker cannot write; remarks and ticks appear live in the margin', async () => {
    await engineer.reload();
    await engineer.getByRole('button', { name: 'Hand over for check' }).click();
    await sign(engineer, /Sign and hand over/);
    checker = await stage.enter('checker');
    await checker.goto(address);
    await expect.poll(() => said(checker, '0.3'), { timeout: 20_000 }).toContain('949.8');
    await cell(checker, '0.2').focus();
    await checker.keyboard.press('Enter');
    expect(await cell(checker, '0.2').locator('.cm-content[contenteditable=true]').count()).toBe(0);
    await checker.keyboard.press('m');
    await checker
      .getByLabel(/remark/i)
      .last()
      .fill('Which drawing?');
    await checker.keyboard.press('Control+Enter');
    await engineer.getByText('Which drawing?').first().waitFor();
    await engineer.getByRole('button', { name: 'Answer' }).first().click();
    await engineer.getByLabel(/Answer to R1/).fill('CT-90, sheet 2.');
    await engineer.keyboard.press('Control+Enter');
    await checker.getByText('CT-90, sheet 2.').waitFor();
    await checker.getByRole('button', { name: 'Close', exact: true }).click();
    for (const number of ['0.1', '0.2', '0.3']) {
      await checker.getByRole('button', { name: new RegExp(`Tick cell ${number}`) }).click();
      await checker.locator(`button[aria-label^="Tick cell ${number}"][aria-pressed=true]`).waitFor();
    }
  });

  it('a tick falls when a value behind the cell changes, and the signature with it', async () => {
    await write(engineer, '0.2', '\nT_0 = 20 degC');
    await expect
      .poll(() => checker.getByRole('button', { name: /Tick cell 0\.2: changed/i }).count(), { timeout: 20_000 })
      .toBe(1);
    await expect
      .poll(() => engineer.getByRole('button', { name: /hand over|sign again/i }).count(), { timeout: 20_000 })
      .toBe(1);
    await engineer.getByRole('button', { name: /hand over|sign again/i }).click();
    await sign(engineer, /Sign and hand over/);
    await checker.getByRole('button', { name: /Tick cell 0\.2/ }).click();
    await checker.locator('button[aria-label^="Tick cell 0.2"][aria-pressed=true]').waitFor();
    await checker.getByRole('button', { name: 'Sign the check' }).click();
    await sign(checker, /Sign the check/);
  });

  it('the lead locks it; nobody writes in it any more', async () => {
    lead = await stage.enter('lead');
    await lead.goto(address);
    await lead.getByRole('button', { name: /^Lock/ }).click();
    await dialog(lead)
      .getByLabel(/What this revision is/)
      .fill('First issue');
    await sign(lead, /Sign and lock A/);
    await lead.getByText(/Revision A is locked and can only be read/).waitFor();
    await engineer.getByText(/Revision A is locked and can only be read/).waitFor();
    expect(await engineer.getByRole('textbox', { name: /^Pen line/ }).count()).toBe(0);
  });

  it('prints with a title block on every page', async () => {
    const reader = await stage.enter('reader');
    await reader.goto(`${address.replace(/\/[A-Z]$/, '')}/A/report`);
    await reader.locator('.report[data-ready=true]').waitFor();
    const file = join(mkdtempSync(join(tmpdir(), 'wallflux-report-')), 'report.pdf');
    await reader.pdf({ path: file, preferCSSPageSize: true, printBackground: true });
    const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
    const pages = text.split('\f').filter((page) => page.trim() !== '');
    expect(pages.length).toBeGreaterThanOrEqual(2);
    for (const [index, page] of pages.entries()) {
      expect(page).toContain('2417-C-005');
      expect(page).toContain(`${index + 1} of ${pages.length}`);
      expect(page).toContain('O. Varga');
      expect(page).toContain('H. Quaye');
      expect(page).toContain('A. Brodie');
    }
    expect(text).toContain('949.8');
    expect(text).not.toContain('Not released');
    expect(execFileSync('pdffonts', [file], { encoding: 'utf8' })).toMatch(/SourceSerif4.*TrueType/);
  });

  it('goes on in the next revision, and the trail tells it all', async () => {
    await lead
      .getByRole('button', { name: /Begin revision B/ })
      .first()
      .click();
    const begins = dialog(lead).getByRole('button', { name: /Begin/ });
    if (await begins.count()) await begins.click();
    await lead.waitForURL(/\/B$/);
    await expect.poll(() => said(lead, '0.3'), { timeout: 20_000 }).toContain('949.8');
    await lead.getByRole('link', { name: 'Trail' }).click();
    await lead
      .getByText(/signed revision A as approved and locked it/)
      .first()
      .waitFor();
  });

  it('writes no error to any console', () => {
    expect(stage.complaints).toEqual([]);
  });
});
