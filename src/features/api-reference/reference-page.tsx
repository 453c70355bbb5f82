import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { API_BASE } from '../../../shared/contracts/route.ts';
import { Field } from '../../components/ui/field.tsx';
import { Page, PageHeading } from '../../components/ui/page.tsx';
import { Sheet } from '../../components/ui/sheet.tsx';
import { Stamp } from '../../components/ui/stamp.tsx';
import { TextInput } from '../../components/ui/text-input.tsx';

interface Operation {
  operationId: string;
  summary: string;
  tags: string[];
  security?: unknown[];
  parameters?: { name: string; in: string; required?: boolean }[];
  requestBody?: { content: Record<string, { schema: unknown }> };
  responses: Record<string, { description: string; content?: Record<string, { schema: unknown }> }>;
}

interface OpenApi {
  openapi: string;
  paths: Record<string, Record<string, Operation>>;
}

const openApiQuery = () =>
  queryOptions({
    queryKey: ['open-api'] as const,
    queryFn: async ({ signal }) => (await (await fetch(`${API_BASE}/openapi.json`, { signal })).json()) as OpenApi,
    staleTime: Infinity,
  });

function Schema({ title, schema }: { title: string; schema: unknown }) {
  return (
    <details>
      <summary className="min-h-thumb cursor-pointer py-2 text-note">{title}</summary>
      <pre className="figures overflow-x-auto rounded border border-hairline p-3 text-note" tabIndex={0}>
        {JSON.stringify(schema, null, 2)}
      </pre>
    </details>
  );
}

function OneOperation({ method, path, operation }: { method: string; path: string; operation: Operation }) {
  const body = Object.values(operation.requestBody?.content ?? {})[0]?.schema;
  return (
    <li className="border-b border-hairline py-4 last:border-b-0">
      <p className="flex flex-wrap items-center gap-2">
        <Stamp tone="gun-blue">{method.toUpperCase()}</Stamp>
        <code className="figures text-note break-all">{path}</code>
      </p>
      <p className="py-1">
        {operation.summary}
        {operation.security ? '' : ' (no sign-in needed)'}
      </p>
      {operation.parameters && (
        <p className="text-note text-lead-grey">
          {operation.parameters.map((one) => `${one.name} (${one.in}${one.required ? ', needed' : ''})`).join(', ')}
        </p>
      )}
      {body !== undefined && <Schema title="What is sent" schema={body} />}
      {Object.entries(operation.responses).map(([status, response]) => {
        const schema = Object.values(response.content ?? {})[0]?.schema;
        return schema === undefined ? (
          <p key={status} className="text-note">
            {status}: {response.description}
          </p>
        ) : (
          <Schema key={status} title={`${status}: ${response.description}`} schema={schema} />
        );
      })}
    </li>
  );
}

/** The API as the contracts say it, to be read; made from the same document that other programs take. */
export function ReferencePage() {
  const { data } = useSuspenseQuery(openApiQuery());
  const [search, setSearch] = useState('');
  const all = Object.entries(data.paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, operation]) => ({ method, path, operation })),
  );
  const found = all.filter(({ path, operation }) =>
    `${path} ${operation.summary} ${operation.operationId}`.toLowerCase().includes(search.toLowerCase()),
  );
  const groups = [...new Set(found.map(({ operation }) => operation.tags[0] ?? ''))];
  return (
    <Page>
      <PageHeading
        title="API reference"
        headline={`OpenAPI ${data.openapi}, ${all.length} acts. The document itself is at ${API_BASE}/openapi.json.`}
      />
      <div className="mb-5 max-w-md">
        <Field label="Find an act">
          <TextInput type="search" value={search} onChange={(event) => setSearch(event.target.value)} />
        </Field>
      </div>
      <div className="grid gap-5">
        {groups.map((group) => (
          <Sheet key={group} title={group}>
            <ul>
              {found
                .filter(({ operation }) => operation.tags[0] === group)
                .map((one) => (
                  <OneOperation key={one.method + one.path} {...one} />
                ))}
            </ul>
          </Sheet>
        ))}
      </div>
    </Page>
  );
}
