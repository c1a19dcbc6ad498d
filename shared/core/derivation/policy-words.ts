/** `v3`: the version of an organisation's limits; the machine entry may name its policies otherwise. */
const VERSION = /^v(\d+)$/;

/** By which limits a result was judged, for its derivation; nothing where the input names no policies. */
export function limitsUsed(policyId: string | null | undefined): string[] {
  if (policyId == null) return [];
  const number = VERSION.exec(policyId)?.[1];
  if (number === undefined) return [`judged by the limits of “${policyId}”`];
  return number === '0'
    ? ['judged by the limits that the product comes with']
    : [`judged by the limits of policy version ${number}`];
}
