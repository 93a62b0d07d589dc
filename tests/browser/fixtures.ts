import { expect, test as base, type BrowserContext, type Page } from '@playwright/test';
import { v7 as newId } from 'uuid';

export const DEMO_PASSWORD = process.env['DEMO_PASSWORD'] ?? 'after-the-cut';
export const PASSWORD = 'plum gravel lantern';

export type Demo = 'grower' | 'neighbour' | 'helper' | 'moderator' | 'admin';
/** Somebody at a browser of their own. */
export type Someone = { page: Page; context: BrowserContext; name: string; email: string };

type Fixtures = {
  /** What a test itself brings about and the browser then reports as an error, such as a refused request. */
  tolerated: RegExp[];
  complaints: string[];
  people: {
    visitor: () => Promise<Someone>;
    demo: (who: Demo) => Promise<Someone>;
    /** A grower whom no other test knows. */
    newGrower: (name?: string) => Promise<Someone>;
    /** The same grower at another browser. */
    elsewhere: (grower: Someone) => Promise<Someone>;
  };
};

/** Every page of every test is listened to: an error in the console, or one nobody caught, fails the test. */
export const test = base.extend<Fixtures>({
  tolerated: [[], { option: true }],

  complaints: [
    async ({ tolerated }, provide) => {
      const complaints: string[] = [];
      await provide(complaints);
      const left = complaints.filter((said) => !tolerated.some((pattern) => pattern.test(said)));
      expect(left, 'what the browser complained of').toEqual([]);
    },
    { auto: true },
  ],

  context: async ({ context, complaints }, provide) => {
    listen(context, complaints);
    await provide(context);
  },

  people: async ({ browser, complaints, contextOptions }, provide) => {
    const opened: BrowserContext[] = [];
    const open = async (name: string, email: string): Promise<Someone> => {
      const context = await browser.newContext(contextOptions);
      opened.push(context);
      listen(context, complaints);
      return { context, page: await context.newPage(), name, email };
    };
    await provide({
      visitor: () => open('a visitor', ''),
      demo: async (who) => {
        const someone = await open(who, `${who}@aftercut.example`);
        await signIn(someone.context, someone.email, DEMO_PASSWORD);
        return someone;
      },
      newGrower: async (name = 'Grower of a test') => {
        const someone = await open(name, `${newId()}@people.example`);
        const data = { name, email: someone.email, password: PASSWORD };
        const answer = await someone.context.request.post('/api/sign-up', { data });
        expect(answer.status(), await answer.text()).toBe(201);
        await signIn(someone.context, someone.email, PASSWORD);
        return someone;
      },
      elsewhere: async ({ name, email }) => {
        const someone = await open(name, email);
        await signIn(someone.context, email, PASSWORD);
        return someone;
      },
    });
    await Promise.all(opened.map((context) => context.close()));
  },
});

export { expect };

function listen(context: BrowserContext, complaints: string[]): void {
  context.on('console', (message) => {
    if (message.type() === 'error') complaints.push(`${message.page()?.url() ?? ''}: ${message.text()}`);
  });
  context.on('weberror', (error) => complaints.push(`not caught: ${error.error().message}`));
}

/** Signs in as any program would; the sign-in page itself has tests of its own. */
async function signIn({ request }: BrowserContext, email: string, password: string): Promise<void> {
  const { csrfToken } = (await (await request.get('/api/auth/csrf')).json()) as { csrfToken: string };
  await request.post('/api/auth/callback/credentials', { form: { email, password, csrfToken } });
  const answer = await request.get('/api/account');
  expect(answer.status(), `signed in as ${email}`).toBe(200);
}
