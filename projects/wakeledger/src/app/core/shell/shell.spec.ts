import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { provideStore } from '@ngrx/store';
import type { Role } from '#shared/access/roles';
import { signedInAs } from '../../../testing/members';
import { Session } from '../session/session';
import { ProgrammeInView } from './programme-in-view';
import { Shell } from './shell';

@Component({ template: '<h1 tabindex="-1">A page</h1>' })
class Page {}

describe('the shell', () => {
  const open = async (role: Role): Promise<HTMLElement> => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideStore({}),
        provideRouter([{ path: '', component: Shell, children: [{ path: 'cycles', component: Page }] }]),
      ],
    });
    const loaded = TestBed.inject(Session).load();
    TestBed.inject(HttpTestingController).expectOne('/api/v1/session').flush(signedInAs(role));
    await loaded;
    TestBed.inject(ProgrammeInView).show({
      id: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0030',
      name: 'Dunlin',
      nextMilestone: { id: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0031', name: 'Clay freeze', date: '2026-03-14' },
      variantCount: 5,
      resultCount: 41,
      variantsWithoutResult: 0,
    });
    const harness = await RouterTestingHarness.create('/cycles');
    return harness.fixture.nativeElement as HTMLElement;
  };
  const sections = (host: HTMLElement): (string | undefined)[] =>
    Array.from(host.querySelectorAll('nav li a'), (link) => link.textContent?.trim());

  it('shows an aerodynamicist all sections, in words', async () => {
    expect(sections(await open('aerodynamicist'))).toEqual([
      'Ranking',
      'Variants',
      'Results',
      'Proposals',
      'Import',
      'Test planning',
      'Reference',
      'Programmes',
      'Facilities',
      'Adjustments',
      'Correlations',
      'Policies',
      'Cycles',
      'For scripts',
    ]);
  });

  it('does not offer a stylist what would be refused', async () => {
    const shown = sections(await open('stylist'));
    expect(shown).toContain('Ranking');
    expect(shown).not.toContain('Results');
    expect(shown).not.toContain('Import');
  });

  it('says which section one is in', async () => {
    const host = await open('viewer');
    expect(host.querySelector('[aria-current="page"]')?.textContent).toBe('Cycles');
  });

  it('names the programme and its next milestone', async () => {
    const bar = (await open('viewer')).querySelector('header')?.textContent;
    expect(bar).toContain('Dunlin');
    expect(bar).toContain('Clay freeze');
    expect(bar).toContain('14 March 2026');
  });

  it('lets the keyboard skip to the page', async () => {
    const host = await open('viewer');
    document.body.append(host);
    host.querySelector<HTMLElement>('.wl-skip')?.click();
    expect(document.activeElement?.id).toBe('wl-sheet');
  });
});
