import { z } from 'zod';
import { role } from '#shared/access/roles.ts';
import { id, listOf, listQuery, ok, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

export const person = z.object({
  id,
  name: z.string(),
  email: z.string(),
  role,
  state: z.enum(['active', 'invited', 'barred']),
  createdAt: time,
});
export type Person = z.infer<typeof person>;

const personParams = z.object({ personId: id });

export const getMe = defineEndpoint({
  method: 'get',
  path: '/api/me',
  summary: 'Who is signed in, and with which role',
  action: 'read-manuals',
  reply: person.pick({ id: true, name: true, email: true, role: true }),
});

export const listPeople = defineEndpoint({
  method: 'get',
  path: '/api/people',
  summary: 'Everybody with an account or an invitation',
  action: 'manage-people',
  query: listQuery,
  reply: listOf(person),
});

/** Enough to mention somebody by, and no more: addresses and roles are for administrators. */
export const personName = person.pick({ id: true, name: true });
export type PersonName = z.infer<typeof personName>;

export const listNames = defineEndpoint({
  method: 'get',
  path: '/api/people/names',
  summary: 'The names of everybody who can be mentioned in a comment',
  action: 'comment',
  query: listQuery,
  reply: listOf(personName),
});

export const invite = z.object({
  name: z.string().trim().min(1, 'Give a name.').max(100),
  email: z.email('Give an e-mail address.'),
  role,
});

export const invitePerson = defineEndpoint({
  method: 'post',
  path: '/api/people',
  summary: 'Invite somebody by e-mail',
  action: 'manage-people',
  body: invite,
  reply: person,
  status: 201,
});

export const updatePerson = defineEndpoint({
  method: 'patch',
  path: '/api/people/:personId',
  summary: 'Change the role or name of somebody, or bar them',
  action: 'manage-people',
  params: personParams,
  body: z.object({
    role: role.optional(),
    name: z.string().trim().min(1).max(100).optional(),
    barred: z.boolean().optional(),
  }),
  reply: person,
});

export const inviteAgain = defineEndpoint({
  method: 'post',
  path: '/api/people/:personId/invitation',
  summary: 'Send the invitation again',
  action: 'manage-people',
  params: personParams,
  reply: ok,
});
