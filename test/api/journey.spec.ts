import 'reflect-metadata';
import { closeSearchPool, makeEvent } from '#club';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import ical from 'node-ical';
import { type Browser, chromium, type Page } from 'playwright-core';
import { startServer, type TestServer } from './testServer';

const axeSource = readFileSync(createRequire(__filename).resolve('axe-core/axe.min.js'), 'utf8');

let server: TestServer;
let browser: Browser;
beforeAll(async () => {
  server = await startServer();
  browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--headless',
      '--no-sandbox',
      '--disable-gpu',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
      '--no-first-run',
    ],
  });
}, 30_000);
afterAll(async () => {
  await browser.close();
  await server.close();
  await closeSearchPool();
});

/** A page that fails the test for whatever its console complains of. */
async function openPage(width: number): Promise<{ readonly page: Page; readonly complaints: string[] }> {
  // The pages run no scripts and their policy says so; the checker is put in past it.
  const context = await browser.newContext({ viewport: { width, height: 800 }, bypassCSP: true });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('console', (message) => complaints.push(message.text()));
  page.on('pageerror', (error) => complaints.push(error.message));
  return { page, complaints };
}

async function faultsOf(page: Page): Promise<readonly string[]> {
  await page.evaluate(axeSource);
  return page.evaluate(async () => {
    const { axe } = globalThis as unknown as {
      readonly axe: {
        run(): Promise<{ readonly violations: readonly { readonly id: string; readonly help: string }[] }>;
      };
    };
    const { violations } = await axe.run();
    return violations.map(({ id, help }) => `${id}: ${help}`);
  });
}

const overflow = (page: Page): Promise<number> =>
  page.evaluate('document.documentElement.scrollWidth - document.documentElement.clientWidth');

it('goes from the ranked evenings to an event, its chart and the calendar, by clicks and keys alone', async () => {
  const { page, complaints } = await openPage(1100);
  await page.goto(`${server.address}/?from=2027-01-10&to=2027-03-31`);
  await page.getByRole('heading', { name: /^Best evenings/ }).waitFor();
  expect(await page.getByText('No event is published yet.').isVisible()).toBe(true);
  expect(await faultsOf(page)).toEqual([]);

  // The reasons open from the keyboard.
  const first = page.locator('.evenings > li').first();
  await first.locator('summary').focus();
  await page.keyboard.press('Enter');
  expect(await first.getByText(/^Programme: .* of 50 points$/).isVisible()).toBe(true);
  expect(await first.getByRole('row', { name: /^Jupiter/ }).isVisible()).toBe(true);
  expect(await faultsOf(page)).toEqual([]);

  await first.getByRole('button', { name: /^Make an event of this/ }).click();
  await page.getByRole('heading', { level: 1, name: /^Winter lights at/ }).waitFor();
  expect(await page.getByText('Draft, not in the calendar yet').first().isVisible()).toBe(true);
  expect(await faultsOf(page)).toEqual([]);

  await page.getByRole('button', { name: /^Publish/ }).click();
  await page.getByText('Published', { exact: true }).waitFor();
  expect(await faultsOf(page)).toEqual([]);

  const chart = page.getByRole('link', { name: 'unaided eye chart of Jupiter' });
  const address = await chart.evaluate((link) => (link as unknown as { readonly href: string }).href);
  const sheet = await page.request.get(address);
  expect(sheet.headers()['content-type']).toBe('application/pdf');
  expect((await sheet.body()).subarray(0, 5).toString()).toBe('%PDF-');

  await page.getByRole('link', { name: 'Fernhollow Sky Club' }).click();
  await page.getByText(/^Next: .* at .*: \d of 4 targets/).waitFor();
  const feedAddress = await page.locator('code').innerText();
  const feed = await (await page.request.get(feedAddress)).text();
  const events = Object.values(ical.sync.parseICS(feed)).filter(({ type }) => type === 'VEVENT');
  expect(events).toMatchObject([{ status: 'CONFIRMED' }]);

  await page.locator('.events summary').click();
  await page.getByLabel('Why it is called off, for the public').fill('Fog in the valley.');
  await page.getByRole('button', { name: /^Call off/ }).click();
  await page.getByText('Called off: Fog in the valley.').first().waitFor();
  expect(await faultsOf(page)).toEqual([]);
  expect(complaints).toEqual([]);
}, 60_000);

it('fits a phone of 360 pixels', async () => {
  const { database, address } = server;
  await makeEvent(database, { siteName: 'Brackenfold', programmeName: 'Winter lights', date: '2027-02-26' });
  const { page, complaints } = await openPage(360);
  await page.goto(`${address}/?from=2027-01-10&to=2027-03-31`);
  await page.locator('.evenings summary').first().click();
  expect(await overflow(page)).toBe(0);
  expect(await faultsOf(page)).toEqual([]);
  await page.locator('.events a').first().click();
  await page.getByRole('heading', { name: 'What to mind' }).waitFor();
  expect(await overflow(page)).toBe(0);
  expect(await faultsOf(page)).toEqual([]);
  expect(complaints).toEqual([]);
}, 60_000);
