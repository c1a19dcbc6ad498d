import type { TakenOver } from './facility-form';

/**
 * A measured session scatter on its way from the control chart to the form, as it stands in the address:
 * `<share of the drag area>~<degrees of freedom>~<comment>`.
 */
export function scatterToAddress({ uRelative, degreesOfFreedom, comment }: TakenOver): string {
  return `${uRelative}~${degreesOfFreedom}~${comment}`;
}

/** Undefined where the address carries none, or one that cannot be used: then the form is filled as it stands. */
export function scatterFromAddress(text: string | undefined): TakenOver | undefined {
  const [u, freedom, ...words] = (text ?? '').split('~');
  const [uRelative, degreesOfFreedom, comment] = [Number(u), Number(freedom), words.join('~').trim()];
  const usable = uRelative > 0 && uRelative < 1 && degreesOfFreedom > 0 && Number.isFinite(degreesOfFreedom);
  return usable && comment !== ''
    ? { uRelative, degreesOfFreedom, comment: comment.slice(0, 1000) }
    : undefined;
}
