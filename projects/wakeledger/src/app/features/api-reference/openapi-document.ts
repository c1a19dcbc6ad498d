import * as z from 'zod';

const schema = z.record(z.string(), z.unknown());

const operation = z.object({
  summary: z.string().default(''),
  'x-access': z.string().optional(),
  parameters: z
    .array(
      z.object({
        name: z.string(),
        in: z.string(),
        required: z.boolean().default(false),
        description: z.string().optional(),
        schema: z.unknown(),
      }),
    )
    .default([]),
  requestBody: z.object({ content: z.record(z.string(), z.object({ schema })) }).optional(),
  responses: z.record(
    z.string(),
    z.object({
      description: z.string().optional(),
      content: z.record(z.string(), z.object({ schema: schema.optional() })).optional(),
    }),
  ),
});

/** What the page reads of the document; the rest is there for machines. */
export const openApiDocument = z.object({
  info: z.object({ title: z.string(), version: z.string(), description: z.string().optional() }),
  paths: z.record(z.string(), z.record(z.string(), operation)),
});
export type OpenApiDocument = z.infer<typeof openApiDocument>;
type Operation = z.infer<typeof operation>;

export interface OperationView {
  readonly id: string;
  readonly method: string;
  readonly path: string;
  readonly summary: string;
  readonly access: string;
  readonly parameters: readonly {
    readonly name: string;
    readonly place: string;
    readonly required: boolean;
    readonly words: string;
  }[];
  readonly body: string | undefined;
  readonly answers: readonly {
    readonly status: string;
    readonly words: string;
    readonly schema: string | undefined;
  }[];
}

export interface OperationGroup {
  readonly name: string;
  readonly operations: readonly OperationView[];
}

/** The operations by the first part of their address, each in the document's order. */
export function operationGroups({ paths }: OpenApiDocument): readonly OperationGroup[] {
  const groups = new Map<string, OperationView[]>();
  for (const [path, methods] of Object.entries(paths)) {
    const parts = path
      .replace(/^\/api\/v\d+\//, '')
      .split('/')
      .filter((part) => !part.startsWith('{'));
    const name = parts[0] === 'programmes' && parts[1] ? parts[1] : (parts[0] ?? path);
    const group = groups.get(name) ?? [];
    groups.set(name, group);
    for (const [method, each] of Object.entries(methods)) group.push(view(method, path, each));
  }
  return [...groups].map(([name, operations]) => ({ name, operations }));
}

function view(method: string, path: string, each: Operation): OperationView {
  const body = Object.values(each.requestBody?.content ?? {})[0]?.schema;
  return {
    id: `${method}${path.replace(/[^a-zA-Z0-9]+/g, '-')}`,
    method: method.toUpperCase(),
    path,
    summary: each.summary,
    access: each['x-access'] ?? '',
    parameters: each.parameters.map(({ name, in: place, required, description, schema: type }) => ({
      name,
      place,
      required,
      words: description ?? typeWords(type),
    })),
    body: body && JSON.stringify(body, null, 2),
    answers: Object.entries(each.responses).map(([status, { description, content }]) => {
      const found = Object.values(content ?? {})[0]?.schema;
      const worth = found && !('$ref' in found);
      return { status, words: description ?? '', schema: worth ? JSON.stringify(found, null, 2) : undefined };
    }),
  };
}

function typeWords(type: unknown): string {
  if (typeof type !== 'object' || type === null) return '';
  const { type: name, format, enum: choices } = type as { type?: unknown; format?: unknown; enum?: unknown };
  if (Array.isArray(choices)) return choices.join(', ');
  return [name, format].filter((part) => typeof part === 'string').join(', ');
}
