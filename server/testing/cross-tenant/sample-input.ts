import { randomUUID } from 'node:crypto';
import * as z from 'zod';

type Schema = Readonly<Record<string, unknown>>;
/** Chooses a value for a property by its name, or leaves it to the rules below. */
export type Chooser = (property: string) => unknown;

/**
 * A valid value of a contract's schema. Full: optional fields are filled too. Lean: only what is required, and what the
 * chooser has a value for.
 */
export function sampleOf(type: z.ZodType, choose: Chooser, extent: 'full' | 'lean' = 'full'): unknown {
  const schema = z.toJSONSchema(type, { io: 'input' }) as Schema;
  const value = sample(extent === 'full' ? schema : leanSchema(schema, choose), '', choose);
  const parsed = type.safeParse(value);
  if (!parsed.success) throw new Error(`no valid sample could be made: ${parsed.error.message}`);
  return value;
}

function leanSchema(schema: Schema, choose: Chooser): Schema {
  const required = (schema['required'] ?? []) as readonly string[];
  const properties = Object.entries((schema['properties'] ?? {}) as Readonly<Record<string, Schema>>);
  const kept = properties.filter(([name]) => required.includes(name) || choose(name) !== undefined);
  return { ...schema, properties: Object.fromEntries(kept) };
}

function sample(schema: Schema, property: string, choose: Chooser): unknown {
  const chosen = choose(property);
  if (chosen !== undefined && schema['type'] === 'string') return chosen;
  if ('const' in schema) return schema['const'];
  if (Array.isArray(schema['enum'])) return schema['enum'][0] as unknown;
  const alternatives = schema['anyOf'] ?? schema['oneOf'];
  if (Array.isArray(alternatives)) return sample(alternatives[0] as Schema, property, choose);
  switch (schema['type']) {
    case 'object': {
      const properties = Object.entries((schema['properties'] ?? {}) as Readonly<Record<string, Schema>>);
      return Object.fromEntries(properties.map(([name, inner]) => [name, sample(inner, name, choose)]));
    }
    case 'array':
      return [sample((schema['items'] ?? {}) as Schema, property, choose)];
    case 'string':
      return sampleText(schema);
    case 'integer':
    case 'number':
      return sampleNumber(schema);
    case 'boolean':
      return true;
    default:
      return {};
  }
}

/** What patterns in contracts ask for: a number in its plain spellings, or a short word. */
const PLAIN: readonly string[] = ['1', '0.5', '1.5', 'a', 'A', 'a-a'];

function sampleText(schema: Schema): string {
  if (schema['format'] === 'uuid') return randomUUID();
  if (schema['format'] === 'date') return '2026-03-01';
  if (schema['format'] === 'date-time') return '2026-03-01T00:00:00Z';
  const pattern = schema['pattern'];
  if (typeof pattern === 'string') {
    return PLAIN.find((candidate) => new RegExp(pattern).test(candidate)) ?? '';
  }
  return `sample ${randomUUID()}`.slice(0, Math.min(Number(schema['maxLength'] ?? 40), 40));
}

function sampleNumber(schema: Schema): number {
  const lowest = Number(schema['minimum'] ?? schema['exclusiveMinimum'] ?? 0);
  const highest = Number(schema['maximum'] ?? schema['exclusiveMaximum'] ?? Number.POSITIVE_INFINITY);
  if (schema['type'] === 'integer') return Math.max(1, Math.min(lowest, 1_000_000));
  return highest < 1 ? (Math.max(lowest, 0) + highest) / 2 : Math.max(lowest, Math.min(1, highest));
}
