import type { SpeciesResponse } from '@/lib/cases/schema';
import { expect, PASSWORD, test } from './fixtures';
import { daysAgo, entryIdOf } from './records';

/** A species of the catalogue of which the demo records nothing. */
const SPECIES = { slug: 'carpinus-betulus', name: 'Hornbeam', scientific: 'Carpinus betulus' };

const NO_CASE = { entries: 0, branches: 0, rate: null };

test('a grower’s errand: from making an account to the figure on the species page', async ({ people }) => {
  test.slow();
  const grower = await people.visitor();
  const { page } = grower;
  const unique = Date.now().toString(36);
  const orchard = `Strip below the weir ${unique}`;
  const title = `Hornbeam at the gate ${unique}`;
  const email = `errand-${unique}@people.example`;
  const response = async () =>
    (await (await page.request.get(`/api/species/${SPECIES.slug}/response`)).json()) as SpeciesResponse;
  const before = await response();

  await test.step('makes an account and signs in', async () => {
    await page.goto('/sign-in');
    await page.getByRole('link', { name: 'Make one' }).click();
    await page.getByLabel('Name', { exact: true }).fill('Ida of the errand');
    await page.getByLabel('E-mail address').fill(email);
    await page.getByLabel('Password').fill(PASSWORD);
    await page.getByRole('button', { name: 'Make the account' }).click();
    await expect(page).toHaveURL(/\/orchards$/);
    await page.getByRole('link', { name: 'Ida of the errand' }).click();
    await page.getByRole('button', { name: 'Sign out' }).click();
    await expect(page.getByRole('link', { name: 'Sign in', exact: true })).toBeVisible();
    await page.goto('/sign-in');
    await page.getByLabel('E-mail address').fill(email);
    await page.getByLabel('Password').fill(PASSWORD);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await expect(page).toHaveURL(/\/orchards$/);
  });

  await test.step('makes an orchard', async () => {
    await page.goto('/orchards/new');
    await page.getByLabel('Name', { exact: true }).fill(orchard);
    await page.getByLabel('Latitude').fill('-12.3456');
    await page.getByLabel('Longitude').fill('45.6789');
    await page.getByLabel('Elevation').fill('447');
    await page.getByLabel('Sun').selectOption('full');
    await page.getByLabel('Wind').selectOption('sheltered');
    await page.getByLabel('Water').selectOption('moderate');
    await page.getByRole('button', { name: 'Add this orchard' }).click();
    await expect(page.getByRole('heading', { level: 1, name: orchard })).toBeVisible();
    await page.getByRole('link', { name: 'Write down a cut' }).first().click();
  });

  await test.step('writes down the cut and what grew', async () => {
    await page.getByLabel('Title').fill(title);
    await page.getByRole('combobox', { name: 'Species' }).fill(SPECIES.scientific);
    await page.getByRole('option', { name: SPECIES.scientific }).click();
    await expect(page.getByLabel('Orchard')).toHaveValue(/.+/);
    await page.getByLabel('Date of the cut').fill(daysAgo(63));
    await page.getByLabel('Kind').selectOption('heading');
    const depth = page.getByRole('slider');
    await depth.focus();
    await page.keyboard.press('Home');
    for (let steps = 0; steps < 4; steps++) await page.keyboard.press('PageUp');
    await expect(depth).toHaveAttribute('aria-valuetext', /a heavy cut/);
    await page.getByRole('group', { name: 'Tip' }).getByText('removed').click();
    await page.getByLabel('Branches').fill('4');
    await page.getByLabel('Stage').selectOption('dormant');
    await page
      .getByRole('textbox', { name: /^The record/ })
      .getByRole('paragraph')
      .first()
      .click();
    await page.keyboard.type('Four limbs over the gate, headed back on a dry day.');
    await page.getByRole('button', { name: 'Add a reading' }).click();
    await page.getByLabel('Date counted').fill(daysAgo(7));
    await page.getByLabel('Shoots on each branch').fill('7 9 - 11');
    await expect(page.getByText('27 on 3 branches, 9.0 each, 1 lost')).toBeVisible();
    await expect(page.getByRole('status').filter({ hasText: 'All saved.' })).toBeVisible();
  });

  const id = entryIdOf(page);
  await test.step('finds everything again after a reload', async () => {
    await page.reload();
    await expect(page.getByLabel('Title')).toHaveValue(title);
    await expect(page.getByRole('combobox', { name: 'Species' })).toHaveValue(/Carpinus betulus/);
    await expect(page.getByRole('slider')).toHaveAttribute('aria-valuetext', /a heavy cut/);
    await expect(page.getByRole('radio', { name: 'removed' })).toBeChecked();
    await expect(page.getByLabel('Branches')).toHaveValue('4');
    await expect(page.getByLabel('Stage')).toHaveValue('dormant');
    await expect(page.getByLabel('Date of the cut')).toHaveValue(daysAgo(63));
    await expect(page.getByLabel('Date counted')).toHaveValue(daysAgo(7));
    await expect(page.getByLabel('Shoots on each branch')).toHaveValue('7 9 - 11');
    await expect(page.getByText('Four limbs over the gate')).toBeVisible();
  });

  await test.step('sends it to the bench, where it changes no figure yet', async () => {
    await page.getByRole('button', { name: 'Send to the bench' }).click();
    await expect(page).toHaveURL(new RegExp(`/entries/${id}$`));
    await expect(page.getByText('Waiting on the bench.')).toBeVisible();
    expect(await response()).toEqual(before);
    await page.goto('/entries');
    await expect(page.getByRole('row').filter({ hasText: title })).toContainText('waiting on the bench');
  });

  await test.step('a moderator accepts it', async () => {
    const { page: desk } = await people.demo('moderator');
    await desk.goto('/bench');
    await desk.getByRole('link', { name: title }).click();
    const record = desk.getByRole('article');
    await expect(record.getByRole('heading', { name: title })).toBeVisible();
    await expect(record).toContainText('Four limbs over the gate');
    await expect(record).not.toContainText(orchard);
    await record.getByRole('button', { name: 'Accept' }).click();
    await expect(desk.getByRole('link', { name: title })).toHaveCount(0);
  });

  await test.step('the figures changed by exactly this entry', async () => {
    const after = await response();
    const isCase = (one: SpeciesResponse['cases'][number]) => one.class === 'heavy' && one.tip === 'removed';
    const others = (all: SpeciesResponse) => all.cases.filter((one) => !isCase(one));
    expect(others(after)).toEqual(others(before));
    const seen = (all: SpeciesResponse) => {
      const { entries, branches, rate } = all.cases.find(isCase)?.seen ?? NO_CASE;
      return { entries, branches, shoots: (rate ?? 0) * branches };
    };
    const was = seen(before);
    const is = seen(after);
    expect(is.entries).toBe(was.entries + 1);
    expect(is.branches).toBe(was.branches + 3);
    expect(is.shoots).toBeCloseTo(was.shoots + 27, 9);
  });

  await test.step('a visitor sees the figure, the record and its cell, and not whose orchard', async () => {
    const { page: reader } = await people.visitor();
    await reader.goto(`/species/${SPECIES.slug}`);
    const row = reader
      .getByRole('table', { name: /Shoots on a branch/ })
      .getByRole('row')
      .filter({ hasText: 'heavy, tip removed' });
    await expect(row.getByRole('cell', { name: '9', exact: true })).toBeVisible();
    await reader.getByRole('link', { name: title }).click();
    await expect(reader.getByRole('heading', { level: 1, name: title })).toBeVisible();
    await expect(reader.getByText('7 9 - 11')).toBeVisible();
    await expect(reader.getByText('within the cell around 12.35° S 45.65° E')).toBeVisible();
    await expect(reader.getByText('400 m above the sea')).toBeVisible();
    const source = await reader.content();
    for (const secret of [orchard, '12.3456', '45.6789', '447 m', email])
      expect(source).not.toContain(secret);
  });
});
