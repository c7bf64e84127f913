import { z } from 'zod';
import { lowestRole } from '#shared/access/roles.ts';
import { problem } from '#shared/api/common.ts';
import type { Endpoint } from '#shared/api/endpoint.ts';

type Json = Record<string, unknown>;

const contentTypes = {
  json: 'application/json',
  text: 'text/plain',
  file: 'application/octet-stream',
  events: 'text/event-stream',
};

/** Describes the served endpoints as OpenAPI 3.1, from the schemas that check them. */
export function openApiDocument(endpoints: readonly Endpoint[], version: string): Json {
  const paths: Record<string, Json> = {};
  for (const endpoint of endpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [endpoint.method]: operation(endpoint) };
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Benchleaf', version, description: 'Scanned manuals in, live and searchable pages out.' },
    paths: { ...paths, ...signInPaths },
    components: {
      schemas: { Problem: schemaOf(problem, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'better-auth.session_token' } },
    },
  };
}

function operation(endpoint: Endpoint): Json {
  const failure = {
    description: 'Problem details',
    content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
  };
  const who = endpoint.action === null ? 'Open to all.' : `Role: ${lowestRole[endpoint.action]} or above.`;
  const requestBody = bodyOf(endpoint);
  return {
    summary: endpoint.summary,
    description: who,
    ...(endpoint.action === null ? {} : { security: [{ session: [] }], 'x-role': lowestRole[endpoint.action] }),
    parameters: [...parametersOf(endpoint.params, 'path'), ...parametersOf(endpoint.query, 'query')],
    ...(requestBody === null ? {} : { requestBody }),
    responses: {
      [endpoint.status]: {
        description: 'Done',
        content: { [contentTypes[endpoint.replyKind]]: { schema: schemaOf(endpoint.reply, 'output') } },
      },
      '4XX': failure,
    },
  };
}

function bodyOf({ method, body, filesField }: Endpoint): Json | null {
  if (filesField !== undefined) {
    const files = { type: 'array', items: { type: 'string', format: 'binary' } };
    return { content: { 'multipart/form-data': { schema: { type: 'object', properties: { [filesField]: files } } } } };
  }
  if (method === 'get' || method === 'delete' || body.type === 'unknown') return null;
  return { content: { 'application/json': { schema: schemaOf(body, 'input') } } };
}

function parametersOf(schema: z.ZodType, place: 'path' | 'query'): Json[] {
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as { properties?: Json; required?: string[] };
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }));
}

/** JSON Schema of a zod schema; what JSON Schema has no word for is left open. */
const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Json;
  return rest;
};

const answered = (summary: string): Json => ({
  summary,
  description: 'Of the sign-in library.',
  responses: { 200: { description: 'Done' } },
});
const credentials = {
  content: {
    'application/json': {
      schema: {
        type: 'object',
        required: ['email', 'password'],
        properties: { email: { type: 'string' }, password: { type: 'string' } },
      },
    },
  },
};
const signInPaths: Record<string, Json> = {
  '/api/auth/sign-in/email': { post: { ...answered('Sign in; sets the session cookie'), requestBody: credentials } },
  '/api/auth/sign-out': { post: answered('Sign out') },
  '/api/auth/get-session': { get: answered('The session of the cookie, or null') },
};
