import type { Routes } from '@angular/router';

/** Every page, loaded when it is first opened. A page registers its own line here, with its question as the title. */
export const routes: Routes = [];
