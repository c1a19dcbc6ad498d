import { Injectable, computed, inject, signal } from '@angular/core';
import { Store } from '@ngrx/store';
import { firstValueFrom } from 'rxjs';
import type { Permission } from '#shared/access/permissions';
import {
  type SessionState,
  demoSignIn,
  organisationSwitch,
  passwordSet,
  passwordSignIn,
  sessionRead,
  signOut,
} from '#shared/contracts/session';
import { ApiClient } from '../api/api-client';
import { SessionActions } from './session.actions';

export type Member = NonNullable<SessionState['member']>;
export type DemoPerson = NonNullable<SessionState['demoPeople']>[number];

export interface PasswordSignIn {
  readonly organisationSlug: string;
  readonly email: string;
  readonly password: string;
}

/**
 * Who is signed in, and what that allows. Whenever the person or the organisation changes, the store is told, which
 * forgets everything that the former member could see.
 */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly api = inject(ApiClient);
  private readonly store = inject(Store);
  private readonly state = signal<SessionState | undefined>(undefined);
  private loading: Promise<void> | undefined;

  readonly member = computed<Member | undefined>(() => this.state()?.member);
  readonly demoPeople = computed<readonly DemoPerson[]>(() => this.state()?.demoPeople ?? []);
  readonly permissions = computed<ReadonlySet<Permission>>(() => new Set(this.member()?.permissions ?? []));
  readonly membership = computed(() =>
    this.member()?.memberships.find((each) => each.organisationId === this.member()?.organisationId),
  );

  constructor() {
    this.api.sessionEnded.subscribe(() => this.forget());
  }

  may(permission: Permission): boolean {
    return this.permissions().has(permission);
  }

  /** Asks the server once; later calls are answered from memory. */
  async load(): Promise<void> {
    if (this.state()) return;
    this.loading ??= firstValueFrom(this.api.call(sessionRead, {}))
      .then((state) => this.accept(state))
      .finally(() => (this.loading = undefined));
    return this.loading;
  }

  async signIn(body: PasswordSignIn): Promise<void> {
    this.accept(await firstValueFrom(this.api.call(passwordSignIn, { body })));
  }

  /** Spends a one-time token on a password. @returns what else signing in needs; nobody is signed in yet */
  async setPassword(token: string, password: string): Promise<Omit<PasswordSignIn, 'password'>> {
    return firstValueFrom(this.api.call(passwordSet, { body: { token, password } }));
  }

  async continueAs(userId: string): Promise<void> {
    this.accept(await firstValueFrom(this.api.call(demoSignIn, { body: { userId } })));
  }

  async switchTo(organisationId: string): Promise<void> {
    this.accept(await firstValueFrom(this.api.call(organisationSwitch, { body: { organisationId } })));
  }

  async signOut(): Promise<void> {
    this.accept(await firstValueFrom(this.api.call(signOut, {})));
  }

  private accept(state: SessionState): void {
    const before = this.member();
    this.state.set(state);
    const after = state.member;
    if (before && (before.userId !== after?.userId || before.organisationId !== after.organisationId)) {
      this.store.dispatch(SessionActions.memberChanged());
    }
  }

  private forget(): void {
    this.state.update((state) => state && { ...state, member: undefined });
    this.store.dispatch(SessionActions.memberChanged());
  }
}
