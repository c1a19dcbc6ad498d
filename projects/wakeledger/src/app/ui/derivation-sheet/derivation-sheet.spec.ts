import { Clipboard } from '@angular/cdk/clipboard';
import { TestBed } from '@angular/core/testing';
import type { Derivation } from './derivation';
import { DerivationOpener } from './derivation-sheet';
import { derivationSheets } from './derivation-sheets';
import { derivationText, percent } from './derivation-text';

const DERIVATION: Derivation = {
  figure: { value: '0.594', expandedU: '0.008', unit: 'm²', plain: '0.5941 ± 0.0082 m²' },
  summary: 'Dunlin Hatch, zero yaw.',
  steps: [
    {
      title: 'Dynamic pressure',
      result: { shown: '899.3 Pa', plain: '899.3456 Pa' },
      formulaMathml: '<mi>q</mi>',
      formulaText: 'q = ½ρU²',
      values: { shown: '½ × 1.1893 × U_m²', plain: '½ × 1.18932 × U_m²' },
      source: 'moist air after CIPM-2007',
      method: 'dynamic-pressure@1',
      assumed: ['relative humidity 44 %'],
      cautions: ['Over 5 %'],
    },
  ],
  budget: [
    { label: 'session', share: 0.3 },
    { label: 'facility bias', share: 0.7, u: { shown: '0.003 m²', plain: '0.00312 m²' } },
    { label: 'nothing', share: 0 },
  ],
};

describe('the derivation sheet', () => {
  const open = (): HTMLElement => {
    TestBed.inject(DerivationOpener).open(DERIVATION);
    TestBed.tick();
    return document.querySelector<HTMLElement>('wl-derivation-sheet')!;
  };
  afterEach(() => document.querySelector('.cdk-overlay-container')?.remove());

  it('shows each step with formula, values, source, assumptions and cautions', () => {
    const step = open().querySelector('li');
    expect(step?.querySelector('math')).not.toBeNull();
    expect(step?.querySelector('.values sub')?.textContent).toBe('m');
    for (const words of [
      'Dynamic pressure',
      '899.3 Pa',
      '½ × 1.1893',
      'CIPM-2007',
      'assumed: relative humidity 44 %',
      'caution: Over 5 %',
    ]) {
      expect(step?.textContent).toContain(words);
    }
  });

  it('shows the budget largest first, as a table, without what contributes nothing', () => {
    const rows = Array.from(open().querySelectorAll('tbody th'), (cell) => cell.textContent?.trim());
    expect(rows).toEqual(['facility bias', 'session']);
  });

  it('is a dialog named by its title', () => {
    open();
    const dialog = document.querySelector('[role="dialog"]');
    expect(dialog?.getAttribute('aria-labelledby')).toBe('wl-derivation-title');
  });

  it('copies itself as text and says so', () => {
    const copy = jest.spyOn(TestBed.inject(Clipboard), 'copy').mockReturnValue(true);
    const sheet = open();
    sheet.querySelector<HTMLElement>('button')?.click();
    TestBed.tick();
    expect(copy).toHaveBeenCalledWith(derivationText(DERIVATION));
    expect(sheet.textContent).toContain('Copied.');
  });

  it('reads well as text', () => {
    expect(derivationText(DERIVATION).split('\n')).toEqual([
      'Derivation',
      '0.5941 ± 0.0082 m²',
      'Dunlin Hatch, zero yaw.',
      '',
      '1  Dynamic pressure = 899.3456 Pa',
      '   q = ½ρU²',
      '   ½ × 1.18932 × U_m²',
      '   source: moist air after CIPM-2007 (dynamic-pressure@1)',
      '   assumed: relative humidity 44 %',
      '   caution: Over 5 %',
      '',
      'Where the uncertainty comes from',
      '    30 %  session',
      '    70 %  facility bias (u = 0.00312 m²)',
      '     0 %  nothing',
    ]);
    expect(percent(0.001)).toBe('< 1 %');
  });
});

describe('derivationSheets', () => {
  it('takes the figure apart into value, U and unit', () => {
    const [figure] = derivationSheets(DERIVATION);
    expect(figure?.rows[1]).toEqual(['Dunlin Hatch, zero yaw.', 0.5941, 0.0082, 'm²']);
  });

  it('gives each step a row with its result as a number', () => {
    const [, steps] = derivationSheets(DERIVATION);
    expect(steps?.rows).toHaveLength(2);
    expect(steps?.rows[1]).toEqual([
      1,
      'Dynamic pressure',
      899.3456,
      'Pa',
      'q = ½ρU²',
      '½ × 1.18932 × U_m²',
      'moist air after CIPM-2007',
      'dynamic-pressure@1',
      undefined,
      'relative humidity 44 %',
      'Over 5 %',
    ]);
  });

  it('keeps what is no number as text, and leaves the uncertainty out where there is none', () => {
    const [step] = DERIVATION.steps;
    const words = { shown: 'as stated', plain: 'as stated' };
    const sheets = derivationSheets({
      ...DERIVATION,
      figure: { ...DERIVATION.figure, plain: '0.59 m²' },
      steps: [{ ...step!, result: words }],
      budget: [],
    });
    expect(sheets).toHaveLength(2);
    expect(sheets[0]?.rows[1]).toEqual(['Dunlin Hatch, zero yaw.', 0.59, undefined, 'm²']);
    expect(sheets[1]?.rows[1]?.slice(2, 4)).toEqual(['as stated', undefined]);
  });

  it('lists every contribution with its share of the variance', () => {
    const [, , budget] = derivationSheets(DERIVATION);
    expect(budget?.rows.slice(1)).toEqual([
      ['session', 0.3],
      ['facility bias', 0.7, 0.00312, 'm²'],
      ['nothing', 0],
    ]);
  });
});
