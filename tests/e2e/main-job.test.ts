/**
 * The main job as a newcomer does it: a list of 300 lines with ten bad rows becomes a plan, paper, a workbook, an issued plan, cut bars and drops
 * on the rack. The pictures it takes are README's.
 */
import { mkdtempSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import exceljs from 'exceljs';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { axeFaults, openBrowser, openDevice, type SIZES } from '#tests/support/browser.ts';
import { startShop, type RunningShop } from '#tests/support/running-shop.ts';

const root = resolve(import.meta.dirname, '../..');
const list = join(root, 'fixtures/csv/mixed-300.csv');
/** Pictures go to a scratch folder unless they are to be kept for the README. */
const pictures = process.env.KEEP_SCREENS
  ? join(root, 'fixtures/screens')
  : mkdtempSync(join(tmpdir(), 'barwright-screens-'));

let shop: RunningShop;
let browser: Browser;
let planPath = '';

beforeAll(async () => {
  mkdirSync(pictures, { recursive: true });
  [shop, browser] = await Promise.all([startShop({ demo: true }), openBrowser()]);
});
afterAll(async () => {
  await browser.close();
  expect(await shop.stop()).toBe(0);
  if (!process.env.KEEP_SCREENS) rmSync(pictures, { recursive: true, force: true });
});

async function signIn(role: string, size: keyof typeof SIZES) {
  const device = await openDevice(browser, shop.address, size);
  await device.page.goto('/');
  await device.page.getByRole('button', { name: new RegExp(`${role}`, 'i') }).click();
  await device.page.getByRole('navigation', { name: 'Places' }).waitFor();
  return device;
}

const shoot = (page: Page, name: string) => page.screenshot({ path: join(pictures, `${name}.png`) });

/** Whatever stands between a person and the page, as axe sees it. */
async function expectAccessible(page: Page) {
  expect(await axeFaults(page)).toEqual([]);
}

describe('the main job', () => {
  it('a newcomer brings in 300 lines, mends ten rows, plans, prints, exports and issues', async () => {
    const { page, complaints, outside, context } = await signIn('manager', 'desk');
    await page.goto('/jobs');
    await page.getByRole('button', { name: 'Make a job' }).click();
    await page.getByLabel('Number').fill('2503');
    await page.getByLabel('Name', { exact: true }).fill('Pump house platform');
    await page.getByRole('dialog').getByRole('button', { name: 'Make the job' }).click();
    await page
      .getByRole('link', { name: /bring in a part list/i })
      .first()
      .click();

    await page.locator('input[type=file]').setInputFiles(list);
    await page
      .getByRole('button', { name: 'Leave out row 17' })
      .or(page.locator('#problem-17-mark'))
      .first()
      .waitFor();
    await expectAccessible(page);
    await shoot(page, 'upload');
    const fix = async (row: number, field: string, text: string) => {
      const input = page.getByLabel(new RegExp(`^${field}.*of row ${row}$`, 'i'));
      await input.fill(text);
      await input.press('Enter');
      await input.waitFor({ state: 'detached' });
    };
    await fix(17, 'mark', 'PF-NEW');
    await fix(46, 'section', 'FB 1/2x4');
    await fix(73, 'section', 'FB 3/8x4');
    await page.getByRole('button', { name: /use L4x4x3\/8 as section on row 101/i }).click();
    await page.getByRole('button', { name: /use C6x8\.2 as section on row 128/i }).click();
    await fix(160, 'quantity', '2');
    await fix(189, 'length', `7'-3 1/2"`);
    await fix(214, 'quantity', '3');
    await page.getByRole('button', { name: /leave out row 247/i }).click();
    await fix(279, 'length', '12-6');
    await page.getByRole('button', { name: 'Save part list' }).click();
    await page.getByRole('link', { name: 'Plan these' }).click();

    await page.getByRole('button', { name: 'Look for stock' }).click();
    await page.getByRole('button', { name: 'Plan the cuts' }).waitFor();
    await expectAccessible(page);
    // Section FB 1/2x4 has no offer yet: the planner types a length and its price.
    const missing = page.getByRole('region', { name: 'FB 1/2x4 A36' });
    await missing.getByLabel('Price a bar').fill('92.40');
    await missing.getByRole('button', { name: 'Add', exact: true }).click();
    await page.getByRole('button', { name: 'Plan the cuts' }).click();
    await page.getByRole('button', { name: 'Save as draft' }).waitFor({ timeout: 240_000 });
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Save as draft' }).click();
    await page.waitForURL(/\/plans\/\d+$/);
    planPath = new URL(page.url()).pathname;
    await page
      .getByText(/no plan costs less than/)
      .first()
      .waitFor();
    await shoot(page, 'plan');
    await expectAccessible(page);

    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('button', { name: 'Spreadsheet' }).click(),
    ]);
    const book = new exceljs.Workbook();
    await book.xlsx.load(readFileSync(await download.path()).buffer);
    expect(book.worksheets.map(({ name }) => name)).toEqual(['Bars', 'Cuts', 'Bill', 'Drops']);
    expect(typeof book.getWorksheet('Bars')?.getCell('H2').value).toBe('number');

    await page.goto(`${planPath}/print`);
    await page.getByRole('button', { name: 'Print' }).waitFor();
    await page.evaluate(() => document.fonts.ready);
    const pdf = join(pictures, 'sheets.pdf');
    writeFileSync(pdf, await page.pdf({ preferCSSPageSize: true, printBackground: true }));
    const text = readFileSync(pdf, 'latin1');
    const sheets = await page.locator('.print-sheet').count();
    expect(text.match(/\/Type \/Page\b/g)?.length).toBe(sheets);
    await page.emulateMedia({ media: 'print' });
    await page
      .locator('.print-sheet')
      .nth(1)
      .screenshot({ path: join(pictures, 'print.png') });
    rmSync(pdf);
    await page.emulateMedia({ media: 'screen' });

    await page.goto(planPath);
    await page
      .getByRole('list', { name: /bar maps of/i })
      .first()
      .scrollIntoViewIfNeeded();
    await page.locator('canvas').first().waitFor();
    await shoot(page, 'bar-maps');
    await page.getByRole('button', { name: 'Issue' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Issue' }).click();
    await page
      .getByText(/issued at/)
      .first()
      .waitFor();
    expect(outside).toEqual([]);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('the operator marks bars as cut', async () => {
    const { page, complaints, context } = await signIn('operator', 'tablet');
    await page.goto(planPath.replace('/plans/', '/bench/'));
    // At least three bars, and on until one of them leaves a drop worth keeping.
    for (let bar = 0, drops = 0; bar < 3 || (drops === 0 && bar < 40); bar++) {
      await page.getByRole('button', { name: 'It is on the machine' }).waitFor();
      const unknown = page.getByRole('radio', { name: 'unknown' });
      if ((await unknown.count()) > 0) await page.locator('label', { has: unknown }).click();
      await page.getByRole('button', { name: 'It is on the machine' }).click();
      await page.getByRole('button', { name: 'All cuts are done' }).waitFor();
      if (bar === 0) {
        await expectAccessible(page);
        await shoot(page, 'bench');
      }
      await page.getByRole('button', { name: 'All cuts are done' }).click();
      await page.getByRole('button', { name: 'Bar is cut' }).waitFor();
      const slot = page.getByLabel('Slot it goes to');
      if ((await slot.count()) > 0) {
        await slot.fill('E-1-1');
        drops++;
      }
      await page.getByRole('button', { name: 'Bar is cut' }).click();
      await page.getByRole('button', { name: 'Bar is cut' }).waitFor({ state: 'detached' });
    }
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('the rack shows the drops they made', async () => {
    const { page, complaints, context } = await signIn('yard', 'desk');
    await page.goto('/rack');
    await page.getByRole('table').waitFor();
    await shoot(page, 'rack');
    await expectAccessible(page);
    await page.goto('/rack?text=E-1-1');
    await page.getByRole('table').getByText('E-1-1').first().waitFor();
    await context.close();
    const phone = await signIn('yard', 'phone');
    await phone.page.goto('/rack');
    await phone.page
      .getByText(/D-\d{4}/)
      .first()
      .waitFor();
    await shoot(phone.page, 'rack-phone');
    await expectAccessible(phone.page);
    expect([...complaints, ...phone.complaints]).toEqual([]);
    await phone.context.close();
  });
});
