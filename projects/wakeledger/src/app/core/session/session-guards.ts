import { inject } from '@angular/core';
import { type CanActivateFn, RedirectCommand, Router } from '@angular/router';
import type { Permission } from '#shared/access/permissions';
import { Session } from './session';

/** Pages behind sign-in. The address asked for is kept and reached after sign-in. */
export const signedIn: CanActivateFn = async (_, state) => {
  const session = inject(Session);
  const router = inject(Router);
  try {
    await session.load();
  } catch {
    // The server cannot be reached: say so at the address asked for, so that a reload tries again.
    return new RedirectCommand(router.parseUrl('/unavailable'), { skipLocationChange: true });
  }
  if (session.member()) return true;
  // Whoever came to the front door is led to where they last worked; an address of its own is kept.
  const frontDoor = state.url === '/' || state.url === '/programmes';
  return router.createUrlTree(['/sign-in'], frontDoor ? {} : { queryParams: { return: state.url } });
};

/** Pages that need a permission: the server refuses anyway, this spares the person a broken page. */
export function needs(...anyOf: readonly Permission[]): CanActivateFn {
  return () => {
    const session = inject(Session);
    const router = inject(Router);
    if (anyOf.some((permission) => session.may(permission))) return true;
    return new RedirectCommand(router.parseUrl('/not-yours'), { skipLocationChange: true });
  };
}
