import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import {
  CHECK_FINDINGS,
  CHECK_NAMES,
  CHECK_VERDICTS,
  check,
  limit,
  type Check,
} from '#shared/core/checks/check';
import { QuantityFormat } from '../quantity/quantity-format';
import { checkName, checkSentence } from './check-words';
import { Checks } from './checks';

const mach = check({
  check: 'mach',
  verdict: 'caution',
  value: 0.214,
  limit: limit({ to: 0.2, excludedAbove: 0.3 }),
});
const blockage = check({
  check: 'blockage',
  verdict: 'excluded',
  value: 0.124,
  unit: 'fraction',
  limit: limit({ to: 0.05, excludedAbove: 0.1 }),
});
const condition = check({ check: 'condition', verdict: 'passes' });

const sentence = (each: Check): string =>
  checkSentence(each, { format: TestBed.inject(QuantityFormat), locale: 'en-GB' });

function shown(checks: readonly Check[]): HTMLElement {
  const fixture = TestBed.createComponent(Checks, { bindings: [inputBinding('checks', signal(checks))] });
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
}

describe('the words of a check', () => {
  it('name value and limit, with units', () => {
    expect(sentence(mach)).toBe(
      'Mach 0.21 is over 0.20: the air begins to be compressed, and the drag with it.',
    );
    expect(sentence(blockage)).toContain('Blockage 12.4\u202f%, over the limit of 10.0\u202f%');
  });

  it('say what was meant where a temperature looks like kelvin', () => {
    const words = sentence(
      check({
        check: 'refused',
        verdict: 'excluded',
        value: 293.15,
        unit: '°C',
        finding: 'kelvin',
        refusal: {
          code: 'temperature-out-of-range',
          where: 'air.temperatureC',
          detail: '293.15 is outside −40 to 60 °C: probably mistyped.',
        },
      }),
    );
    expect(words).toContain('293.15 is outside');
    expect(words).toContain('It looks like kelvin: 293.15 K is 20.0\u202f°C.');
  });

  it('tell what differs in the test condition', () => {
    const items = [{ item: 'ground', reference: 'several-belts', stated: 'fixed-floor' }];
    expect(sentence(check({ check: 'condition', verdict: 'excluded', items }))).toBe(
      'Not comparable with the reference condition: ground fixed floor, not several belts. It stays out of the ranking.',
    );
    expect(sentence(check({ check: 'condition', verdict: 'passes', finding: 'adjusted', items }))).toContain(
      'adjustments',
    );
  });

  const refusal = { code: 'yaw-no-zero', where: 'points', detail: 'There is no point at zero yaw.' };

  it('are a whole sentence for every check, verdict and finding, with nothing undefined in it', () => {
    for (const name of CHECK_NAMES) {
      expect(checkName(name)).not.toBe('');
      for (const verdict of CHECK_VERDICTS) {
        for (const finding of [null, ...CHECK_FINDINGS]) {
          const words = sentence(
            check({ check: name, verdict, value: 1.2, limit: limit({ from: 1, to: 2 }), finding, refusal }),
          );
          expect(words).toMatch(/^[A-Z0-9].*\.$/s);
          expect(words).not.toMatch(/undefined|null|NaN/);
        }
      }
    }
  });
});

describe('the list of checks', () => {
  it('begins with the gravest, gives each a word and a shape, and folds what passes away', () => {
    const host = shown([condition, mach, blockage]);
    const open = [...host.querySelectorAll(':scope > ul > li')];
    expect(open.map((item) => item.querySelector('strong')?.textContent)).toEqual([
      'Blockage',
      'Mach number',
    ]);
    expect(open.map((item) => item.querySelector('.verdict')?.textContent)).toEqual([
      ', excluded',
      ', caution',
    ]);
    expect(open.map((item) => item.querySelector('.shape')?.textContent)).toEqual(['■', '▲']);
    const folded = host.querySelector('details');
    expect(folded?.open).toBe(false);
    expect(folded?.querySelector('summary')?.textContent).toContain('1 check passes');
    expect(folded?.textContent).toContain('Test condition');
  });

  it('shows only what passes where nothing asks for a look', () => {
    const host = shown([condition, { ...mach, verdict: 'passes' }]);
    expect(host.querySelector(':scope > ul')).toBeNull();
    expect(host.querySelector('summary')?.textContent).toContain('2 checks pass');
  });
});
