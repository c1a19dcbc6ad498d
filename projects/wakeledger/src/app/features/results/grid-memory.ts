import { DOCUMENT, Injectable, inject } from '@angular/core';
import type { GridState } from 'ag-grid-community';
import { Session } from '../../core/session/session';

/** Columns, their order and filters as this person left them, in this browser. */
@Injectable({ providedIn: 'root' })
export class GridMemory {
  private readonly document = inject(DOCUMENT);
  private readonly session = inject(Session);

  read(grid: string): GridState | undefined {
    try {
      const text = this.document.defaultView?.localStorage.getItem(this.keyOf(grid));
      const value: unknown = JSON.parse(text ?? 'null');
      return typeof value === 'object' && value !== null ? (value as GridState) : undefined;
    } catch {
      return undefined;
    }
  }

  keep(grid: string, state: GridState): void {
    const { columnOrder, columnSizing, columnVisibility, filter, sort } = state;
    try {
      this.document.defaultView?.localStorage.setItem(
        this.keyOf(grid),
        JSON.stringify({
          columnOrder,
          columnSizing,
          columnVisibility,
          filter,
          sort,
          partialColumnState: true,
        }),
      );
    } catch {
      // A browser that keeps nothing still shows everything.
    }
  }

  forget(grid: string): void {
    try {
      this.document.defaultView?.localStorage.removeItem(this.keyOf(grid));
    } catch {
      // Nothing was kept, so nothing is to be forgotten.
    }
  }

  /** What one organisation’s filters say is not shown in another. */
  private keyOf(grid: string): string {
    const member = this.session.member();
    return `wakeledger.grid.${grid}.${member?.organisationId ?? ''}.${member?.userId ?? ''}`;
  }
}
