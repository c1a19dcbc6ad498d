import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { ViewExclusion, ViewExclusionRule } from '#shared/core/ranking/ranking-view';
import { missingAdjustments } from './missing-adjustments';
import { StayedOut } from './stayed-out';

const excluded = (items: ViewExclusionRule['items']): ViewExclusion => ({
  resultId: 'r',
  name: 'R',
  variantId: 'hatch',
  variantName: 'Hatch',
  facilityName: 'Halmere',
  testDate: '2026-03-02',
  adopted: false,
  rules: [
    { rule: 'not-comparable', remedy: 'include-with-reason', value: null, limit: null, items, detail: null },
  ],
});
const GROUND = { item: 'ground', reference: 'several-belts', stated: 'fixed-floor' };

describe('the adjustments that would bring results in', () => {
  it('are named once each, from what was measured to what the programme refers to', () => {
    expect(missingAdjustments([excluded([GROUND]), excluded([GROUND])], 'en-GB')).toEqual([
      {
        words: 'Add an adjustment for ground, from fixed floor to several belts',
        query: { item: 'ground', from: 'fixed-floor', to: 'several-belts' },
      },
    ]);
  });

  it('are per unit for a number, and none for an item that the result does not state', () => {
    const items = [
      { item: 'rideHeightFrontMm', reference: 120, stated: 110 },
      { item: 'mirrors', reference: 'fitted', stated: null },
    ];
    expect(missingAdjustments([excluded(items)], 'en-GB')).toEqual([
      { words: 'Add an adjustment for ride height, front', query: { item: 'rideHeightFrontMm' } },
    ]);
  });

  it.each([
    [true, ['/adjustments/new?item=ground&from=fixed-floor&to=several-belts']],
    [false, []],
  ])('are offered to whoever may add one: %s', (mayAdjust, addresses) => {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    const fixture = TestBed.createComponent(StayedOut, {
      bindings: [
        inputBinding('exclusions', signal([excluded([GROUND])])),
        inputBinding('mayAdjust', signal(mayAdjust)),
      ],
    });
    fixture.detectChanges();
    const links = (fixture.nativeElement as HTMLElement).querySelectorAll('a');
    expect([...links].map((link) => link.getAttribute('href'))).toEqual(addresses);
  });
});
