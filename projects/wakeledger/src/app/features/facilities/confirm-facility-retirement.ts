import type { Facility } from '#shared/contracts/facilities';
import { confirmInDialog } from '../../ui/confirm-dialog/confirm-dialog';

/** Asks before a facility is taken out of the choices. Needs an injection context. */
export function confirmFacilityRetirement({ name }: Pick<Facility, 'name'>): Promise<boolean> {
  return confirmInDialog({
    title: $localize`Retire ${name}:NAME:?`,
    detail: $localize`It is no longer offered for new results. Results from it keep counting, and it can be brought back at any time.`,
    confirm: $localize`Retire`,
    cancel: $localize`Keep it`,
    severe: true,
  });
}
