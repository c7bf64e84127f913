import { parseArgs } from 'node:util';
import { z } from 'zod';
import { readConfig } from '#server/config/config.ts';
import { readOrCreateSecret } from '#server/config/secret.ts';
import { openDatabase } from '#server/db/database.ts';
import { createAuth, findUserByEmail, record } from '#server/features/accounts/index.ts';

/** Makes the first administrator and prints a one-time link to choose a password: `--email you@your.org [--name You]`. */
async function run(): Promise<void> {
  const { values } = parseArgs({ options: { email: { type: 'string' }, name: { type: 'string' } } });
  const email = z.email().safeParse(values.email);
  if (!email.success) throw new Error('Say whose account it is: npm run admin:create -- --email you@your.org');
  const config = readConfig(process.env);
  const { db, close } = openDatabase(config.dataDir);
  const publicUrl = config.publicUrl ?? `http://127.0.0.1:${config.port}`;
  let link = '';
  const auth = createAuth(
    { db },
    {
      secret: readOrCreateSecret(config.dataDir),
      publicUrl,
      trustedOrigins: [publicUrl],
      sendMail: ({ text }) => {
        link = /https?:\/\/\S+/.exec(text)?.[0] ?? '';
        return Promise.resolve();
      },
    },
  );
  if (findUserByEmail(db, email.data) === undefined) {
    const name = values.name ?? email.data.split('@')[0] ?? 'Administrator';
    const { user } = await auth.api.createUser({ body: { email: email.data, name, role: 'administrator' } });
    record(
      db,
      { id: 'console', name: 'Console' },
      { did: 'created an administrator', subject: email.data, subjectId: user.id },
    );
  }
  await auth.api.requestPasswordReset({ body: { email: email.data } });
  console.log(`Open this link once to choose a password:\n${link}`);
  close();
}

run().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
