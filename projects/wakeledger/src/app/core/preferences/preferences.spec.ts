import { TestBed } from '@angular/core/testing';
import { Preferences } from './preferences';

describe('a person’s preferences', () => {
  beforeEach(() => localStorage.clear());

  it('follow the system until something is chosen', () => {
    TestBed.inject(Preferences);
    TestBed.tick();
    expect(document.documentElement.dataset['theme']).toBeUndefined();
  });

  it('are put on the page and kept for the next visit', () => {
    const preferences = TestBed.inject(Preferences);
    preferences.theme.set('dark');
    preferences.density.set('compact');
    preferences.numberLocale.set('de-DE');
    TestBed.tick();
    expect(document.documentElement.dataset).toMatchObject({ theme: 'dark', density: 'compact' });
    TestBed.resetTestingModule();
    expect(TestBed.inject(Preferences).numberLocale()).toBe('de-DE');
  });

  it.each(['not json', '{"theme":"neon","numberLocale":7}', '[]', 'null'])(
    'survive what cannot be read: %s',
    (stored) => {
      localStorage.setItem('wakeledger.preferences', stored);
      const preferences = TestBed.inject(Preferences);
      expect([preferences.theme(), preferences.numberLocale()]).toEqual(['system', 'en-GB']);
    },
  );
});
