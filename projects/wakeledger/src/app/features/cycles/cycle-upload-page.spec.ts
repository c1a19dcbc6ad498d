import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { provideStore } from '@ngrx/store';
import { of, throwError } from 'rxjs';
import type { CycleDetail } from '#shared/contracts/cycles';
import { ApiProblem } from '../../core/api/api-problem';
import { CyclesApi } from '../../data/cycles/cycles-api';
import { ECHARTS_LOADER } from '../../ui/chart/echarts-loader';
import { CycleUploadPage } from './cycle-upload-page';

const READ: CycleDetail = {
  key: 'own',
  origin: 'own',
  name: 'Hill',
  source: 'runs.csv',
  durationS: 1,
  distanceM: 0.7,
  maximumSpeedKmh: 5,
  meanSpeedKmh: 2.5,
  maximumAccelerationMs2: 1.39,
  cautions: ['The trace is short.'],
  timeS: [0, 1],
  speedKmh: [0, 5],
};

describe('bringing in an own cycle', () => {
  const check = jest.fn();
  const store = jest.fn();
  const open = (): HTMLElement => {
    check.mockReset().mockReturnValue(of(READ));
    store.mockReset().mockReturnValue(of(READ));
    TestBed.configureTestingModule({
      providers: [
        provideStore({}),
        provideRouter([{ path: 'cycles', children: [] }]),
        { provide: CyclesApi, useValue: { check, store } },
        { provide: ECHARTS_LOADER, useValue: () => new Promise(() => undefined) },
      ],
    });
    const fixture = TestBed.createComponent(CycleUploadPage);
    fixture.autoDetectChanges();
    return fixture.nativeElement as HTMLElement;
  };
  const type = (host: HTMLElement, name: string, text: string): void => {
    const field = host.querySelector<HTMLInputElement>(`[formControlName="${name}"]`)!;
    field.value = text;
    field.dispatchEvent(new Event('input'));
  };
  const submit = async (host: HTMLElement): Promise<void> => {
    host.querySelector('form')!.dispatchEvent(new Event('submit'));
    await Promise.resolve();
    await Promise.resolve();
    TestBed.tick();
  };
  const button = (host: HTMLElement, words: string): HTMLElement | undefined =>
    Array.from(host.querySelectorAll<HTMLElement>('button')).find(
      (each) => each.textContent?.trim() === words,
    );

  it('stores nothing before it has shown what was read', async () => {
    const host = open();
    type(host, 'csv', 't,v\n0,0\n1,5');
    type(host, 'name', 'Hill');
    expect(button(host, 'Store it')).toBeUndefined();
    await submit(host);
    expect(store).not.toHaveBeenCalled();
    expect(host.textContent).toContain('The trace is short.');
    button(host, 'Store it')?.click();
    expect(store).toHaveBeenCalledWith(
      { name: 'Hill', csv: 't,v\n0,0\n1,5', timeUnit: 's', speedUnit: 'km/h', remark: undefined },
      expect.any(String),
    );
  });

  it('wants another check after any change', async () => {
    const host = open();
    type(host, 'csv', 't,v\n0,0\n1,5');
    type(host, 'name', 'Hill');
    await submit(host);
    type(host, 'csv', 't,v\n0,0\n1,6');
    TestBed.tick();
    expect(button(host, 'Store it')).toBeUndefined();
  });

  it('says what was wrong where it was, and keeps the lines', async () => {
    const host = open();
    check.mockReturnValue(
      throwError(
        () =>
          new ApiProblem('unusable-input', {
            type: '/problems/unusable-input',
            title: 'x',
            status: 422,
            code: 'unusable-input',
            where: 'csv',
            detail: 'Line 3: “five” is not a number.',
          }),
      ),
    );
    type(host, 'csv', 't,v\n0,0\n1,five');
    type(host, 'name', 'Hill');
    await submit(host);
    expect(host.querySelector('.error')?.textContent + (host.textContent ?? '')).toContain(
      '“five” is not a number',
    );
    expect(host.querySelector<HTMLTextAreaElement>('textarea')?.value).toContain('five');
  });
});
