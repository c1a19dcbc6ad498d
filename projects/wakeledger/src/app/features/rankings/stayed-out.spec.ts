import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { ViewExclusion, ViewExclusionRule } from '#shared/core/ranking/ranking-view';
import { StayedOut } from './stayed-out';

const rule = (changes: Partial<ViewExclusionRule>): ViewExclusionRule => ({
  rule: 'no-wind-average:yaw-too-few-angles',
  remedy: 'measure-yaw',
  value: null,
  limit: null,
  items: [],
  detail: null,
  ...changes,
});
const mach = rule({ rule: 'mach', remedy: 'change-policy', value: 0.31, limit: 0.3 });

function exclusions(count: number): readonly ViewExclusion[] {
  return Array.from({ length: count }, (_, index) => ({
    resultId: `r${index}`,
    name: `R-${index}`,
    variantId: 'hatch',
    variantName: 'Hatch',
    facilityName: 'Halmere',
    testDate: '2026-03-02',
    adopted: index === 1,
    rules: index === 0 ? [mach, rule({})] : [rule({})],
  }));
}

function shown(count: number): HTMLElement {
  const fixture = TestBed.createComponent(StayedOut, {
    bindings: [inputBinding('exclusions', signal(exclusions(count)))],
  });
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
}
const words = (element: Element | null | undefined) => element?.textContent?.replace(/\s+/g, ' ').trim();
const summaries = (host: HTMLElement) => [...host.querySelectorAll('summary')].map(words);

describe('what stayed out', () => {
  it('is read one by one up to six results', () => {
    const host = shown(6);
    expect(summaries(host)).toHaveLength(6);
    expect(summaries(host)[0]).toBe(
      'Hatch, R-0, Halmere, 2026-03-02: Mach 0.31, over the limit of 0.30 and no wind average: fewer than three yaw angles',
    );
    expect(words(host.querySelector('details p'))).toContain('The limit is a policy of the organisation');
  });

  it('is read by rule beyond: how many, why, who may do what, and every result within', () => {
    const host = shown(7);
    expect(summaries(host)).toEqual([
      '7 results: no wind average: fewer than three yaw angles (adopted evidence among them)',
      '1 result: Mach number over the limit of 0.30',
    ]);
    const [wind, tooFast] = host.querySelectorAll('details');
    expect(words(wind?.querySelector('p'))).toContain('a yaw sweep would bring it in');
    expect([...(wind?.querySelectorAll('li') ?? [])]).toHaveLength(7);
    expect(words(wind?.querySelectorAll('li')[1])).toBe('Hatch, R-1, Halmere, 2026-03-02 (adopted)');
    expect(words(tooFast?.querySelector('li'))).toBe(
      'Hatch, R-0, Halmere, 2026-03-02: Mach 0.31, over the limit of 0.30; also no wind average: fewer than three yaw angles',
    );
  });

  it('says when nothing did', () => {
    expect(words(shown(0))).toContain('Nothing: every result can be used.');
  });
});
