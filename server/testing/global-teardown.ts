/** jest's globalTeardown: the cluster and everything in it goes. */
export default async function globalTeardown(): Promise<void> {
  await globalThis.endTestCluster?.();
}
