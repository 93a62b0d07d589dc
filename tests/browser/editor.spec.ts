import type { Locator, Page } from '@playwright/test';
import { expect, test } from './fixtures';
import { daysAgo, entryBody, entryIdOf, makeEntry, makeOrchard, stored } from './records';

const badge = (page: Page, text: string) => page.getByRole('status').filter({ hasText: text });
const summary = (page: Page) => page.getByRole('main').getByRole('alert');

test.describe('an entry changed in two places', () => {
  test.use({ tolerated: [/status of 412/] });

  test('shows both versions, overwrites nothing, and keeps what is chosen', async ({ people }) => {
    const grower = await people.newGrower();
    const { request } = grower.context;
    const orchard = await makeOrchard(request, 'Orchard of two desks');
    const { id } = await makeEntry(request, entryBody(orchard), 'draft');
    const there = await people.elsewhere(grower);
    for (const { page } of [grower, there]) {
      await page.goto(`/entries/${id}/edit`);
      await expect(badge(page, 'All saved.')).toBeVisible();
    }
    await there.page.getByLabel('Cultivar').fill('Lantern');
    await expect.poll(async () => (await stored(request, id)).cultivar).toBe('Lantern');

    const { page } = grower;
    await page.getByLabel('Cultivar').fill('Old Weir');
    const both = page.getByRole('region', { name: 'This was also changed elsewhere' });
    await expect(both).toBeFocused();
    const row = both.getByRole('row').filter({ hasText: 'Cultivar' });
    await expect(row.getByRole('cell')).toHaveText(['Old Weir', 'Lantern']);
    await expect(badge(page, 'nothing was overwritten')).toBeVisible();
    expect((await stored(request, id)).cultivar).toBe('Lantern');

    await page.getByRole('button', { name: 'Keep mine' }).click();
    await expect(badge(page, 'All saved.')).toBeVisible();
    expect((await stored(request, id)).cultivar).toBe('Old Weir');

    await there.page.getByLabel('Cultivar').fill('Third name');
    await there.page.getByRole('button', { name: 'Take theirs' }).click();
    await expect(there.page.getByLabel('Cultivar')).toHaveValue('Old Weir');
    expect((await stored(request, id)).cultivar).toBe('Old Weir');
  });
});

test.describe('an entry sent too early', () => {
  test.use({ tolerated: [/status of 422/] });

  test('is not sent: what it lacks is listed, each with a way to its field', async ({ people }) => {
    const { page, context } = await people.newGrower();
    await page.goto('/entries/new');
    await page.getByLabel('Title').fill('Half an entry');
    await expect(badge(page, 'All saved.')).toBeVisible();
    await page.getByRole('button', { name: 'Send to the bench' }).click();
    const lacks = summary(page);
    await expect(lacks).toBeFocused();
    const names = ['Species', 'Orchard', 'Sun', 'Wind', 'Water', 'Date of the cut', 'Kind of cut'];
    for (const name of [...names, 'How much came off', 'Tip', 'Branches marked', 'Stage', 'Readings'])
      await expect(lacks.getByRole('link', { name, exact: true })).toBeVisible();
    await lacks.getByRole('link', { name: 'Species', exact: true }).click();
    await expect(page.getByRole('combobox', { name: 'Species' })).toBeFocused();
    await page.keyboard.type('ficus carica');
    await page.keyboard.press('Enter');
    await expect(lacks.getByRole('link', { name: 'Species', exact: true })).toHaveCount(0);
    await lacks.getByRole('link', { name: 'Stage', exact: true }).click();
    await expect(page.getByLabel('Stage')).toBeFocused();
    expect((await stored(context.request, entryIdOf(page))).status).toBe('draft');
  });
});

test('an entry sent with two quick clicks is sent once', async ({ people }) => {
  const { page, context } = await people.newGrower();
  const orchard = await makeOrchard(context.request, 'Orchard of the quick hand');
  const { id } = await makeEntry(context.request, entryBody(orchard), 'draft');
  const sent: string[] = [];
  page.on('request', (request) => {
    if (request.method() === 'POST' && request.url().endsWith('/submit')) sent.push(request.url());
  });
  await page.goto(`/entries/${id}/edit`);
  await page.getByRole('button', { name: 'Send to the bench' }).dblclick();
  await expect(page.getByText('Waiting on the bench.')).toBeVisible();
  expect(sent).toHaveLength(1);
});

test.describe('without a signal', () => {
  test.use({ tolerated: [/ERR_INTERNET_DISCONNECTED/] });

  test('what is typed is safe on the device, says so, and goes up with the signal', async ({ people }) => {
    const { page, context } = await people.newGrower();
    const orchard = await makeOrchard(context.request, 'Orchard behind the hill');
    const { id } = await makeEntry(context.request, entryBody(orchard), 'draft');
    await page.goto(`/entries/${id}/edit`);
    await expect(badge(page, 'All saved.')).toBeVisible();
    await context.setOffline(true);
    await page.getByLabel('Title').fill('Typed behind the hill');
    await expect(badge(page, 'Safe on this device. Going up when there is a signal.')).toBeVisible();
    await page.getByRole('button', { name: 'Send to the bench' }).click();
    await expect(summary(page)).toContainText('Try again when there is a signal');
    await context.setOffline(false);
    await expect(badge(page, 'All saved.')).toBeVisible();
    const view = await stored(context.request, id);
    expect(view).toMatchObject({ title: 'Typed behind the hill', status: 'draft' });
  });

  test('what was typed outlives a closed tab', async ({ people }) => {
    const { page, context } = await people.newGrower();
    const orchard = await makeOrchard(context.request, 'Orchard of the closed tab');
    const { id } = await makeEntry(context.request, entryBody(orchard), 'draft');
    await page.goto(`/entries/${id}/edit`);
    await expect(badge(page, 'All saved.')).toBeVisible();
    await context.setOffline(true);
    await page.getByLabel('Cultivar').fill('Blue Hour');
    await expect(badge(page, 'Safe on this device. Going up when there is a signal.')).toBeVisible();
    await page.close();
    await context.setOffline(false);
    const later = await context.newPage();
    await later.goto(`/entries/${id}/edit`);
    await expect(later.getByLabel('Cultivar')).toHaveValue('Blue Hour');
    await expect(later.getByText('Opened with what this device had kept and not yet sent.')).toBeVisible();
    await expect.poll(async () => (await stored(context.request, id)).cultivar).toBe('Blue Hour');
  });
});

test('the keyboard alone fills in an entry and is never trapped', async ({ people }) => {
  test.slow();
  const { page, context } = await people.newGrower();
  await makeOrchard(context.request, 'Orchard without a mouse');
  await page.goto('/entries/new');
  await expect(page.getByLabel('Title')).toBeVisible();
  const { keyboard } = page;

  await tabTo(page, page.getByLabel('Title'));
  await keyboard.type('By keyboard alone');
  await tabTo(page, page.getByRole('combobox', { name: 'Species' }));
  await keyboard.type('higuera');
  await keyboard.press('ArrowDown');
  await keyboard.press('Enter');
  await tabTo(page, page.getByLabel('Date of the cut'));
  await keyboard.type(americanDate(70));
  await tabTo(page, page.getByLabel('Kind'));
  await keyboard.type('heading');
  const depth = page.getByRole('slider');
  await tabTo(page, depth);
  await keyboard.press('End');
  await expect(depth).toHaveAttribute('aria-valuetext', 'all, a severe cut');
  await tabTo(page, page.getByRole('radio', { name: 'kept' }));
  await keyboard.press('ArrowRight');
  await tabTo(page, page.getByLabel('Branches'));
  await keyboard.type('4');
  await tabTo(page, page.getByLabel('Stage'));
  await keyboard.type('dormant');
  await keyboard.press('Escape');
  await keyboard.type('After the cut.');
  await tabTo(page, page.getByRole('button', { name: 'Add a reading' }));
  await keyboard.press('Enter');
  await expect(page.getByLabel('Date counted')).toBeFocused();
  await keyboard.type(americanDate(14));
  await tabTo(page, page.getByLabel('Shoots on each branch'));
  await keyboard.type('7 9 - 11');
  await expect(page.getByText('27 on 3 branches, 9.0 each, 1 lost')).toBeVisible();
  await expect(badge(page, 'All saved.')).toBeVisible();
  const view = await stored(context.request, entryIdOf(page));
  expect(view).toMatchObject({
    title: 'By keyboard alone',
    species: 'ficus-carica',
    cut: { date: daysAgo(70), kind: 'heading', severity: 1, tip: 'removed', branches: 4, stage: 'dormant' },
    readings: [{ date: daysAgo(14), counts: [7, 9, null, 11] }],
  });
  expect(JSON.stringify(view.doc)).toContain('After the cut.');

  await tabTo(page, page.getByRole('link', { name: 'How to count' }), 'forwards, out below');
  await tabTo(page, page.getByRole('link', { name: 'Aftercut' }), 'backwards, out above', 'Shift+Tab');
  await tabTo(page, page.getByRole('button', { name: 'Send to the bench' }));
  await keyboard.press('Enter');
  await expect(page.getByText('Waiting on the bench.')).toBeVisible();
});

/** More presses than the editor has places to stop at, a date field having four. */
const MOST_STOPS = 70;

/** Goes on with the Tab key until the focus is there. */
async function tabTo(page: Page, target: Locator, way = 'forwards', key = 'Tab'): Promise<void> {
  const isThere = () => target.evaluate((element) => element === document.activeElement);
  for (let stops = 0; stops < MOST_STOPS; stops++) {
    if (await isThere()) return;
    await page.keyboard.press(key);
  }
  const at = await page.evaluate(() => document.activeElement?.outerHTML.slice(0, 200));
  throw new Error(`The focus never came to ${target.toString()} (${way}); it stands at ${at}`);
}

/** A day as it is typed into a date field of the browser's own, month first. */
function americanDate(days: number): string {
  const [year, month, day] = daysAgo(days).split('-');
  return `${month}${day}${year}`;
}
