import { OpenApiGeneratorV31, OpenAPIRegistry, extendZodWithOpenApi } from '@asteasolutions/zod-to-openapi';
import { z } from 'zod';
import { ALL_ROUTES } from '../../shared/contracts/all-routes.ts';
import { API_BASE, type AnyRoute } from '../../shared/contracts/route.ts';
import { PROBLEMS, problemSchema } from '../../shared/problems/problems.ts';

extendZodWithOpenApi(z);

type Document = ReturnType<OpenApiGeneratorV31['generateDocument']>;

const openApiPath = (path: string): string => `${API_BASE}${path.replace(/:(\w+)/g, '{$1}')}`;

function responsesOf(route: AnyRoute): Record<string, object> {
  const good = route.raw
    ? { description: 'The bytes of the file', content: { 'application/octet-stream': { schema: z.string() } } }
    : route.status === 204
      ? { description: 'Done' }
      : { description: 'The answer', content: { 'application/json': { schema: route.response } } };
  const codes = [
    ...route.problems,
    'input-invalid' as const,
    ...(route.access === 'signed-in' ? (['not-signed-in'] as const) : []),
    ...(route.keyed ? (['idempotency-key-missing', 'idempotency-key-reused'] as const) : []),
  ];
  const byStatus = new Map<number, Set<string>>();
  for (const code of codes) {
    const { status } = PROBLEMS[code];
    byStatus.set(status, (byStatus.get(status) ?? new Set()).add(code));
  }
  const refusals: Record<string, object> = {};
  for (const [status, group] of byStatus)
    refusals[status] = {
      description: [...group].join(', '),
      content: { 'application/problem+json': { schema: problemSchema } },
    };
  return { [route.status]: good, ...refusals };
}

function build(): Document {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'session', { type: 'apiKey', in: 'cookie', name: 'ferrule' });
  for (const { name, group, route } of ALL_ROUTES) {
    registry.registerPath({
      method: route.method.toLowerCase() as 'get' | 'post' | 'patch' | 'delete',
      path: openApiPath(route.path),
      operationId: name,
      summary: route.summary,
      tags: [group],
      ...(route.access === 'signed-in' ? { security: [{ session: [] }] } : {}),
      request: {
        params: route.params,
        query: route.query,
        ...(route.keyed ? { headers: z.object({ 'idempotency-key': z.string().min(8).max(128) }) } : {}),
        ...(route.method === 'GET' || route.method === 'DELETE'
          ? {}
          : {
              body: {
                content: {
                  [route.multipart ? 'multipart/form-data' : 'application/json']: { schema: route.body as z.ZodObject },
                },
              },
            }),
      },
      responses: responsesOf(route),
    });
  }
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Ferrule',
      version: '1',
      description: 'Every act of the product. Refusals are application/problem+json (RFC 9457).',
    },
    servers: [{ url: '/' }],
  });
}

let document: Document | undefined;

/** OpenAPI 3.1 from the same contracts that the server mounts; built once. */
export const openApiDocument = (): Document => (document ??= build());
