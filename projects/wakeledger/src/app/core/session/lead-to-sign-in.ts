import { inject } from '@angular/core';
import { Router } from '@angular/router';
import { ApiClient } from '../api/api-client';

/**
 * When the server no longer knows the session, leads to sign-in and, from there, back to the page that was open. A page
 * with unsaved changes asks first, like on any other way out of it. To be called once, at start.
 */
export function leadToSignIn(): void {
  const router = inject(Router);
  inject(ApiClient).sessionEnded.subscribe(() => {
    // Several answers may say it at once; who is there already is not led in circles.
    if (router.url.startsWith('/sign-in')) return;
    void router.navigate(['/sign-in'], { queryParams: { return: router.url } });
  });
}
