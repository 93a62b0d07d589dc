import { expect, test } from './fixtures';
import { daysAgo, entryBody, makeEntry, makeOrchard, readingBody, stored } from './records';

// The note that is missing is asked for by the server.
test.use({ tolerated: [/status of 422/] });

test('a moderator sends an entry back with a note, and accepts it once it is mended', async ({ people }) => {
  test.slow();
  const grower = await people.newGrower('Grower with a slip');
  const orchard = await makeOrchard(grower.context.request, 'Terrace with a slip');
  const title = `Fig counted twice ${Date.now().toString(36)}`;
  const { id } = await makeEntry(
    grower.context.request,
    entryBody(orchard, {
      title,
      readings: [
        readingBody({ date: daysAgo(40), counts: [1, 0, 2, 3] }),
        readingBody({ date: daysAgo(14), counts: [70, 90, null, 110] }),
      ],
    }),
  );
  const note = 'Seventy shoots on one branch: was that the whole tree?';
  const { page: bench, context: moderator } = await people.demo('moderator');

  await test.step('the queue shows who sent what, and the record in full', async () => {
    await bench.goto('/bench');
    const row = bench.getByRole('row').filter({ hasText: title });
    await expect(row).toContainText('Grower with a slip');
    await expect(row).toContainText('a new entry');
    await row.getByRole('link', { name: title }).click();
    await expect(bench.getByRole('article')).toContainText('70 90 - 110');
    await expect(bench.getByRole('article')).not.toContainText('Terrace with a slip');
  });

  await test.step('sending back needs a note', async () => {
    await bench.getByRole('button', { name: 'Send back with the note' }).click();
    await expect(bench.getByRole('main').getByRole('alert')).toContainText('Note');
    await expect(bench.getByRole('main').getByRole('alert')).toBeFocused();
    expect((await stored(grower.context.request, id)).status).toBe('waiting');
    await bench.getByLabel('Note').fill(note);
    await bench.getByRole('button', { name: 'Send back with the note' }).click();
    await expect(bench.getByRole('link', { name: title })).toHaveCount(0);
  });

  const { page } = grower;
  await test.step('the grower reads the note, mends the count and sends it again', async () => {
    await page.goto('/entries');
    await expect(page.getByRole('row').filter({ hasText: title })).toContainText('sent back with a note');
    await page.getByRole('link', { name: title }).click();
    await expect(page.getByText(note)).toBeVisible();
    await page.getByRole('link', { name: 'Go on writing' }).click();
    await page.getByLabel('Shoots on each branch').nth(1).fill('7 9 - 11');
    await expect(page.getByRole('status').filter({ hasText: 'All saved.' })).toBeVisible();
    await page.getByRole('button', { name: 'Send to the bench' }).click();
    await expect(page.getByText('Waiting on the bench.')).toBeVisible();
  });

  await test.step('it is accepted with one of its readings set aside', async () => {
    await bench.goto(`/bench?open=${id}`);
    await expect(bench.getByRole('article')).toContainText('7 9 - 11');
    await bench.getByRole('checkbox', { name: /6 on 4 branches|6 shoots|1\.5/ }).check();
    await bench.getByRole('button', { name: 'Accept' }).click();
    await expect(bench.getByRole('link', { name: title })).toHaveCount(0);
    const view = await stored(moderator.request, id);
    expect(view.status).toBe('accepted');
    expect(view.readings.map(({ setAside }) => setAside)).toEqual([true, false]);
  });

  await test.step('anyone sees which reading stays out of the figures', async () => {
    const { page: reader } = await people.visitor();
    await reader.goto(`/entries/${id}`);
    const readings = reader.getByRole('region', { name: /^Reading/ });
    await expect(readings.nth(0)).toContainText('Set aside by the bench');
    await expect(readings.nth(1)).not.toContainText('Set aside by the bench');
    await expect(reader.getByText(note)).toHaveCount(0);
  });
});

test('nobody is offered to judge their own entry', async ({ people }) => {
  const { page, context } = await people.demo('moderator');
  const orchard = await makeOrchard(context.request, 'Terrace of a moderator');
  const title = `A moderator’s own fig ${Date.now().toString(36)}`;
  const { id } = await makeEntry(context.request, entryBody(orchard, { title }));
  await page.goto(`/bench?open=${id}`);
  await expect(page.getByRole('article').getByRole('heading', { name: title })).toBeVisible();
  await expect(page.getByText('This one is yours; another moderator decides.')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Accept' })).toHaveCount(0);
  await expect(page.getByRole('button', { name: /Send back/ })).toHaveCount(0);
  const tried = await context.request.post(`/api/bench/entries/${id}/decision`, {
    data: { decision: 'accept', note: null, setAside: [] },
  });
  expect(tried.status()).toBe(403);
  await page.goto(`/entries/${id}`);
  await expect(page.getByRole('link', { name: 'Read it on the bench' })).toHaveCount(0);
});

test.describe('a decision about a record that changed meanwhile', () => {
  test.use({ tolerated: [/status of 412/] });

  test('is refused, and the moderator is told', async ({ people }) => {
    const grower = await people.newGrower('Grower with second thoughts');
    const { request } = grower.context;
    const orchard = await makeOrchard(request, 'Terrace of second thoughts');
    const body = entryBody(orchard, { title: `Changed on the bench ${Date.now().toString(36)}` });
    const { id, revision } = await makeEntry(request, body);
    const { page: bench } = await people.demo('moderator');
    await bench.goto(`/bench?open=${id}`);
    await expect(bench.getByRole('button', { name: 'Accept' })).toBeVisible();
    const changed = await request.put(`/api/entries/${id}`, {
      data: { ...body, cultivar: 'Lantern' },
      headers: { 'if-match': `"${revision}"` },
    });
    expect(changed.status()).toBe(200);
    await bench.getByRole('button', { name: 'Accept' }).click();
    await expect(bench.getByRole('main').getByRole('alert')).toBeVisible();
    expect((await stored(request, id)).status).toBe('waiting');
  });
});

test('the bench is not there for growers and visitors', async ({ people }) => {
  const grower = await people.demo('grower');
  await grower.page.goto('/');
  await expect(grower.page.getByRole('link', { name: 'Bench' })).toHaveCount(0);
  expect((await grower.page.request.get('/bench')).status()).toBe(404);
  const visitor = await people.visitor();
  expect((await visitor.page.request.get('/bench')).status()).toBe(404);
});
