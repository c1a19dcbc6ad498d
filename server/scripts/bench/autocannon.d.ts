/** The part of autocannon that the benchmark uses; the package brings no types. */
declare module 'autocannon' {
  interface Options {
    readonly url: string;
    readonly connections: number;
    readonly duration: number;
    readonly headers?: Readonly<Record<string, string>>;
  }
  interface Result {
    readonly requests: { readonly average: number };
    readonly latency: { readonly p50: number; readonly p99: number };
    readonly non2xx: number;
    readonly errors: number;
  }
  // The package is one function, as CommonJS knows it.
  function autocannon(options: Options): Promise<Result>;
  export = autocannon;
}
