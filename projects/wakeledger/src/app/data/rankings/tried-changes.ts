import { Injectable } from '@angular/core';
import * as z from 'zod';
import { judgementChange, type JudgementChange } from '#shared/contracts/proposals';

const KEY = 'wakeledger.tried.';
const list = z.array(judgementChange).max(100);

/** Changes that are tried, kept in this tab of the browser for as long as it is open. */
@Injectable({ providedIn: 'root' })
export class TriedChanges {
  /** None where nothing readable was kept. */
  of(programmeId: string): readonly JudgementChange[] {
    try {
      const read = list.safeParse(JSON.parse(sessionStorage.getItem(KEY + programmeId) ?? '[]'));
      return read.success ? read.data : [];
    } catch {
      return [];
    }
  }

  /** A browser that keeps nothing loses what is tried with the page, and nothing else. */
  keep(programmeId: string, changes: readonly JudgementChange[]): void {
    try {
      if (changes.length === 0) sessionStorage.removeItem(KEY + programmeId);
      else sessionStorage.setItem(KEY + programmeId, JSON.stringify(changes));
    } catch {
      return;
    }
  }
}
