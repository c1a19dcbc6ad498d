import { MODULES } from '../modules/registry';
import { openApiDocument } from './openapi';

const endpoints = MODULES.flatMap((module) => module.routes.map((route) => route.endpoint));
const document = openApiDocument(endpoints) as {
  readonly paths: Readonly<
    Record<
      string,
      Readonly<
        Record<
          string,
          {
            readonly parameters: readonly { readonly name: string; readonly in: string }[];
            readonly responses: Readonly<Record<string, unknown>>;
          }
        >
      >
    >
  >;
};

test.each(endpoints.map((endpoint) => [`${endpoint.method} ${endpoint.path}`, endpoint] as const))(
  '%s is described with every part of its address and its failures',
  (_name, endpoint) => {
    const operation =
      document.paths[endpoint.path.replace(/:(\w+)/g, '{$1}')]?.[endpoint.method.toLowerCase()];
    const inPath = operation?.parameters.filter((one) => one.in === 'path').map((one) => one.name);
    expect(inPath).toEqual([...endpoint.path.matchAll(/:(\w+)/g)].map((match) => match[1]));
    const headers = operation?.parameters.filter((one) => one.in === 'header').map((one) => one.name);
    expect(headers).toEqual([
      ...(endpoint.command ? ['Idempotency-Key'] : []),
      ...(endpoint.versioned ? ['If-Match'] : []),
    ]);
    expect(Object.keys(operation?.responses ?? {})).toEqual(expect.arrayContaining(['200', '400', '500']));
  },
);

test('no two operations share method and address', () => {
  const names = endpoints.map((endpoint) => `${endpoint.method} ${endpoint.path}`);
  expect(new Set(names).size).toBe(names.length);
});
