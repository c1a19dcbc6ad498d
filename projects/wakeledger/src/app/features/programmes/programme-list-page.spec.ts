import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { provideEffects } from '@ngrx/effects';
import { provideStore } from '@ngrx/store';
import type { Role } from '#shared/access/roles';
import { signedInAs } from '../../../testing/members';
import { Session } from '../../core/session/session';
import { provideProgrammes } from '../../data/programmes/provide-programmes';
import { ProgrammeListPage } from './programme-list-page';

describe('the programmes page', () => {
  let http: HttpTestingController;
  const open = async (role: Role): Promise<RouterTestingHarness> => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideStore({}),
        provideEffects(),
        provideProgrammes(),
        provideRouter([{ path: 'programmes', component: ProgrammeListPage }]),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    const loaded = TestBed.inject(Session).load();
    http.expectOne('/api/v1/session').flush(signedInAs(role));
    await loaded;
    return RouterTestingHarness.create('/programmes');
  };
  const text = (harness: RouterTestingHarness): string => {
    harness.detectChanges();
    return (harness.fixture.nativeElement as HTMLElement).textContent?.replace(/\s+/g, ' ') ?? '';
  };

  it('says what is missing in words', async () => {
    const harness = await open('viewer');
    http.expectOne('/api/v1/programmes').flush({
      programmes: [
        {
          id: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0060',
          name: 'Dunlin',
          variantCount: 5,
          resultCount: 41,
          variantsWithoutResult: 2,
        },
      ],
    });
    expect(text(harness)).toContain('2 variants without a result');
  });

  it('tells those who may what to do first when it is empty', async () => {
    const harness = await open('programme-manager');
    http.expectOne('/api/v1/programmes').flush({ programmes: [] });
    expect(text(harness)).toContain('Three steps lead to a ranking');
    expect(text(harness)).toContain('Open a programme');
  });

  it('tells those who may not who does it', async () => {
    const harness = await open('viewer');
    http.expectOne('/api/v1/programmes').flush({ programmes: [] });
    expect(text(harness)).toContain('A programme manager or an aerodynamicist');
    expect(text(harness)).not.toContain('Open a programme');
  });

  it('asks nothing of the server for a supplier, who may not read programmes', async () => {
    const harness = await open('supplier-engineer');
    http.expectNone('/api/v1/programmes');
    expect(text(harness)).toContain('Nothing waits for you here');
  });

  it('offers to try again when the server cannot be reached', async () => {
    const harness = await open('viewer');
    http.expectOne('/api/v1/programmes').error(new ProgressEvent('error'));
    expect(text(harness)).toContain('The server cannot be reached.');
    const retry = (harness.fixture.nativeElement as HTMLElement).querySelector<HTMLElement>(
      '[role="alert"] button',
    );
    retry?.click();
    http.expectOne('/api/v1/programmes');
  });
});
