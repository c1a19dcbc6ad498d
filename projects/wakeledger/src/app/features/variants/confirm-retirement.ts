import type { Variant } from '#shared/contracts/variants';
import { confirmInDialog } from '../../ui/confirm-dialog/confirm-dialog';

/** Asks before a variant leaves the ranking. Needs an injection context. */
export function confirmRetirement({ name }: Pick<Variant, 'name'>): Promise<boolean> {
  return confirmInDialog({
    title: $localize`Retire ${name}:NAME:?`,
    detail: $localize`It leaves the ranking for everybody. Its results and its history stay, and it can be brought back at any time.`,
    confirm: $localize`Retire`,
    cancel: $localize`Keep it`,
    severe: true,
  });
}
