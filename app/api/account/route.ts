import { handler, json, route } from '@/lib/http/handler';
import { Account, AccountBody, accountOf, saveAccount } from '@/lib/people/account';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler({ as: 'grower', summary: 'Your account', output: Account }, async ({ db, actor }) => {
    const account = await accountOf(db, actor);
    return json(account, { etag: account.revision });
  }),
  PUT: handler(
    {
      as: 'grower',
      summary: 'Change how you are called and the units you read',
      body: AccountBody,
      output: Account,
      find: ({ db, actor }) => accountOf(db, actor, { lock: true }),
    },
    async ({ db, subject, body, ifMatch, audit }) => {
      const account = await saveAccount(db, subject, body, ifMatch);
      if (account.revision !== subject.revision) {
        await audit({ action: 'person.changed', subject: { kind: 'person', id: account.id } });
      }
      return json(account, { etag: account.revision });
    },
  ),
});
