import * as z from 'zod';
import { Refused, refuse } from '#shared/core/refusal';
import { NOT_YET_AVAILABLE, OPERATION_NAMES, isOperationName, loadOperation } from './operations';
import type { Operation } from './operation';
import { problemOfRefusal } from './problem-of-refusal';
import { parseJson, readInput } from './read-input';

/** What the process prints and how it ends. */
export interface Answer {
  readonly stdout: string;
  readonly stderr: string;
  readonly exitCode: 0 | 2;
}

const printed = (value: unknown): string => `${JSON.stringify(value)}\n`;

/** @throws {Refused} unknown-operation, not-available */
async function operationOf(name: string): Promise<Operation> {
  if (isOperationName(name)) return loadOperation(name);
  const section = Object.hasOwn(NOT_YET_AVAILABLE, name) ? NOT_YET_AVAILABLE[name] : undefined;
  if (section !== undefined) {
    refuse(
      'not-available',
      `section ${section}`,
      `“${name}” (section ${section} of the method) is not available yet.`,
    );
  }
  return refuse(
    'unknown-operation',
    name,
    `There is no operation “${name}”; there are ${OPERATION_NAMES.join(', ')}.`,
  );
}

function schemaOf(operation: Operation): unknown {
  return z.toJSONSchema(operation.schema, { target: 'draft-2020-12', io: 'input' });
}

/** Numbers that no JSON can hold are no answer: an input that leads there is refused. @throws {Refused} not-a-number */
function checkNumbers(value: unknown, where = 'output'): void {
  if (typeof value === 'number' && !Number.isFinite(value)) {
    refuse('not-a-number', where, 'With this input the answer is beyond the range of numbers.');
  }
  if (typeof value === 'object' && value !== null) {
    for (const [name, inner] of Object.entries(value)) checkNumbers(inner, name);
  }
}

/** Where the input comes from; asked only when an operation needs one. */
type ReadText = () => string | Promise<string>;

async function answerTo(args: readonly string[], readText: ReadText): Promise<string> {
  const [name = '', option] = args;
  if (name === '--list') return OPERATION_NAMES.map((one) => `${one}\n`).join('');
  const operation = await operationOf(name);
  if (option === '--schema') return printed(schemaOf(operation));
  const input = readInput(operation.schema, parseJson(await readText()));
  const output = operation.evaluate(input);
  checkNumbers(output);
  return printed(output);
}

/** One call of the machine entry. A refusal is an answer, any other failure is thrown. */
export async function run(args: readonly string[], readText: ReadText): Promise<Answer> {
  try {
    return { stdout: await answerTo(args, readText), stderr: '', exitCode: 0 };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { stdout: '', stderr: printed(problemOfRefusal(error)), exitCode: 2 };
  }
}
