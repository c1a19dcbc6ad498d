import { startTestCluster } from './test-cluster';

declare global {
  var endTestCluster: (() => Promise<void>) | undefined;
}

/** jest's globalSetup for the server's tests: one throwaway cluster for the whole run. */
export default async function globalSetup(): Promise<void> {
  const { cluster, end } = await startTestCluster();
  process.env['WAKELEDGER_TEST_CLUSTER'] = JSON.stringify(cluster);
  globalThis.endTestCluster = end;
}
