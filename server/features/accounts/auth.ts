import { betterAuth } from 'better-auth';
import { drizzleAdapter } from 'better-auth/adapters/drizzle';
import { fromNodeHeaders } from 'better-auth/node';
import { admin } from 'better-auth/plugins';
import { createAccessControl } from 'better-auth/plugins/access';
import { adminAc, defaultStatements, userAc } from 'better-auth/plugins/admin/access';
import { role } from '#shared/access/roles.ts';
import { account, session, user, verification } from '#server/db/schema/index.ts';
import type { FindSession } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import type { SendMail } from './mail.ts';
import { hasPassword } from './queries.ts';

type Options = { secret: string; publicUrl: string; trustedOrigins: string[]; sendMail: SendMail };
export type Auth = ReturnType<typeof createAuth>;

export const minPasswordLength = 10;
const invitationLastsSeconds = 7 * 24 * 3600;
/** A person who mistypes is let alone; a program that guesses is not. */
const signInTriesAMinute = 30;
const access = createAccessControl(defaultStatements);

/** Sign-in with e-mail and password, sessions in the database. Nobody signs up: people are invited. */
export function createAuth({ db }: Pick<Tools, 'db'>, { secret, publicUrl, trustedOrigins, sendMail }: Options) {
  return betterAuth({
    appName: 'Benchleaf',
    secret,
    baseURL: publicUrl,
    trustedOrigins,
    database: drizzleAdapter(db, { provider: 'sqlite', schema: { user, session, account, verification } }),
    telemetry: { enabled: false },
    // A mistyped password is answered, not logged: only what is wrong with the server is.
    logger: { level: 'error' },
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength,
      resetPasswordTokenExpiresIn: invitationLastsSeconds,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: ({ user: to, token }) => {
        const link = `${publicUrl}/set-password?token=${encodeURIComponent(token)}`;
        return sendMail({ to: to.email, ...letter(to.name, link, hasPassword(db, to.id)) });
      },
    },
    rateLimit: {
      enabled: true,
      window: 60,
      max: 300,
      customRules: {
        '/sign-in/email': { window: 60, max: signInTriesAMinute },
        '/request-password-reset': { window: 60, max: 5 },
      },
    },
    advanced: { ipAddress: { ipAddressHeaders: ['x-client-ip'] }, disableCSRFCheck: false },
    plugins: [
      admin({
        ac: access,
        roles: {
          reader: userAc,
          technician: userAc,
          editor: userAc,
          archivist: userAc,
          administrator: adminAc,
        },
        defaultRole: 'reader',
        adminRoles: ['administrator'],
        bannedUserMessage: 'This account is barred. Ask an administrator.',
      }),
    ],
  });
}

function letter(name: string, link: string, isReset: boolean): { subject: string; text: string } {
  const [subject, why] = isReset
    ? [
        'Choose a new password for Benchleaf',
        'Somebody, most likely you, asked for a new password. If it was not you, do nothing.',
      ]
    : ['You are invited to Benchleaf', 'You have been invited to work on the manuals kept in Benchleaf.'];
  return {
    subject,
    text: `Dear ${name},\n\n${why}\n\nChoose your password here (the link works once, for seven days):\n${link}\n`,
  };
}

/** Reads the session of a request from its cookie. A barred person has none. */
export const sessionFinder =
  (auth: Auth): FindSession =>
  async (request) => {
    const found = await auth.api.getSession({ headers: fromNodeHeaders(request.headers) });
    if (found === null || found.user.banned === true) return null;
    const { id, name, email } = found.user;
    return { id, name, email, role: role.catch('reader').parse(found.user.role), sessionId: found.session.id };
  };
