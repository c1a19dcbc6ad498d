import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { DEFAULT_CHOICES, type RankingChoices } from '#shared/core/ranking/ranking-choices';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import { fiveVariants, manyVariants } from '#shared/testing/ranking-scenario';
import { csvText } from '../../core/export/csv';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { closingSteps, outlineDerivation } from './derivations/outline';
import { exclusionReasons } from './exclusion-words';
import { RankingControls } from './ranking-controls';
import { rankingRows } from './ranking-export';
import { type FigureAsked, RankingTable } from './ranking-table';
import { groupSentence, noticeSentence, probabilityWords } from './ranking-words';

const viewOf = (changes: Partial<RankingChoices> = {}, scenario = fiveVariants()) =>
  buildRankingView(scenario.inputs, scenario.context, { ...DEFAULT_CHOICES, cycle: 'short', ...changes });

const format = () => TestBed.inject(QuantityFormat);

beforeEach(() => TestBed.configureTestingModule({ providers: [provideRouter([])] }));

describe('the ranking’s table', () => {
  function table(view = viewOf()) {
    const fixture = TestBed.createComponent(RankingTable);
    fixture.componentRef.setInput('view', view);
    fixture.componentRef.setInput('programmeId', 'dunlin');
    const asked: FigureAsked[] = [];
    fixture.componentInstance.figureAsked.subscribe((figure) => asked.push(figure));
    TestBed.tick();
    const element = fixture.nativeElement as HTMLElement;
    const stops = () => [...element.querySelectorAll<HTMLElement>('[data-stop]')];
    const press = (key: string) =>
      document.activeElement?.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true }));
    document.body.append(element);
    return { fixture, element, asked, stops, press };
  }
  afterEach(() => document.body.replaceChildren());

  it('holds one row a variant, in the order of the view, each with its sentence for the picture', () => {
    const { element } = table();
    const names = [...element.querySelectorAll('.name')].map((name) => name.textContent?.trim());
    expect(names).toEqual(['Liftback', 'Hatch', 'Sport', 'Tourer', 'Crossback']);
    expect(element.querySelectorAll('wl-statement-line svg[role=img]')).toHaveLength(5);
    expect(element.querySelector('wl-statement-line svg[role=img]')?.getAttribute('aria-label')).toContain(
      'carried 0.5',
    );
  });

  it('is one stop for the tab key; the arrows go from figure to figure', () => {
    const { stops, press } = table();
    expect(stops().filter(({ tabIndex }) => tabIndex === 0)).toHaveLength(1);
    stops()[0]?.focus();
    press('ArrowDown');
    press('ArrowRight');
    press('ArrowRight');
    expect(document.activeElement).toBe(stops()[7]);
    press('Home');
    expect(document.activeElement).toBe(stops()[5]);
    press('ArrowUp');
    press('ArrowUp');
    expect(document.activeElement).toBe(stops()[0]);
    expect(stops().filter(({ tabIndex }) => tabIndex === 0)).toEqual([stops()[0]]);
  });

  it('says which figure of which variant is to be derived', () => {
    const { element, asked } = table();
    const buttons = element.querySelectorAll<HTMLButtonElement>('tbody tr:nth-child(2) button');
    buttons.forEach((button) => button.click());
    expect(asked.map(({ row, kind }) => [row.name, kind])).toEqual([
      ['Hatch', 'drag-area'],
      ['Hatch', 'common-area'],
      ['Hatch', 'own-area'],
      ['Hatch', 'energy'],
    ]);
  });

  it('holds 300 variants whole, so that all of them can be searched and printed', () => {
    expect(table(viewOf({}, manyVariants(300))).element.querySelectorAll('tbody tr')).toHaveLength(300);
  });
});

describe('the ranking’s controls', () => {
  function controls(address: Record<string, string> = {}) {
    const fixture = TestBed.createComponent(RankingControls);
    fixture.componentRef.setInput('view', viewOf());
    fixture.componentRef.setInput('address', address);
    const changes: object[] = [];
    fixture.componentInstance.changed.subscribe((change) =>
      changes.push(JSON.parse(JSON.stringify(change)) as object),
    );
    TestBed.tick();
    const element = fixture.nativeElement as HTMLElement;
    const choose = (name: string, value: string) => {
      const select = element.querySelector<HTMLSelectElement>(`select[name=${name}]`);
      if (!select) throw new Error(`There is no control ${name}.`);
      select.value = value;
      select.dispatchEvent(new Event('change'));
      TestBed.tick();
    };
    return { element, changes, choose };
  }

  it('have a label each', () => {
    const labels = [...controls().element.querySelectorAll('label')].map((label) =>
      label.querySelector('.label')?.textContent?.trim(),
    );
    expect(labels).toEqual([
      'Order by',
      'Reference area',
      'Basis',
      'Evidence',
      'Configuration',
      'Energy on',
      'Air',
      'Confidence',
    ]);
  });

  it('ask for a constant speed, refuse what is none, and put it into the address in place of a cycle', () => {
    const { element, changes, choose } = controls();
    choose('cycle', 'constant');
    const type = (text: string) => {
      const field = element.querySelector<HTMLInputElement>('form input');
      if (!field) throw new Error('The speed is not asked for.');
      field.value = text;
      element.querySelector('form')?.dispatchEvent(new Event('submit'));
      TestBed.tick();
    };
    type('fast');
    expect(element.querySelector('[role=alert]')?.textContent).toContain('between 1 and 500 km/h');
    type('120,5');
    expect(element.querySelector('[role=alert]')).toBeNull();
    expect(changes).toEqual([{ cycle: 'constant:120.5' }]);
  });

  it('put a choice into the address and keep the others; a default leaves it', () => {
    const { changes, choose } = controls({ basis: 'wind-averaged', confidence: '0.9' });
    choose('order', 'energy');
    choose('basis', 'zero-yaw');
    choose('confidence', '0.95');
    expect(changes).toEqual([
      { order: 'energy', basis: 'wind-averaged', confidence: '0.9' },
      { confidence: '0.9' },
      { basis: 'wind-averaged' },
    ]);
  });

  it('ask for an area of one’s own, take a comma, and refuse what is none', () => {
    const { element, changes, choose } = controls();
    choose('area', 'typed');
    const input = element.querySelector<HTMLInputElement>('form input');
    const submit = (text: string) => {
      if (input) input.value = text;
      element.querySelector('form')?.dispatchEvent(new Event('submit'));
      TestBed.tick();
    };
    submit('two');
    expect(element.querySelector('[role=alert]')?.textContent).toContain('between 0.01 and 99');
    submit('2,25');
    expect(changes).toEqual([{ area: '2.25' }]);
  });

  it('ask for an air of one’s own and refuse one that the method would not take', () => {
    const { element, changes, choose } = controls();
    choose('air', 'custom');
    const [temperature] = element.querySelectorAll<HTMLInputElement>('form input');
    const submit = (text: string) => {
      if (temperature) temperature.value = text;
      element.querySelector('form')?.dispatchEvent(new Event('submit'));
      TestBed.tick();
    };
    submit('200');
    expect(element.querySelector('[role=alert]')).not.toBeNull();
    submit('−5');
    expect(changes).toEqual([{ air: 'custom:-5:100000:0.5' }]);
  });
});

describe('the ranking’s words', () => {
  it('name the variants and numbers of an order that changes', () => {
    const view = viewOf();
    const [notice] = view.notices;
    expect(notice && noticeSentence(notice, view, format())).toMatch(
      /^On each variant’s own frontal area, Sport \(0\.\d{3}\) would rank behind Tourer \(0\.\d{3}\): its area is the smallest\. Drag area is what the road feels\.$/,
    );
  });

  it('say how far apart a pair is and how probable its order', () => {
    const pair = { variantIds: ['a', 'b'], names: ['A', 'B'], fromRank: 1, toRank: 2 };
    const group = { ...pair, difference: 0.0061, probability: 0.712 };
    expect(groupSentence(group, viewOf(), format())).toBe(
      'A and B: 0.006\u202fm² apart, probability 0.71 that A is lower.',
    );
    expect(groupSentence({ ...group, names: ['A', 'B', 'C'] }, viewOf(), format())).toContain(
      'A, B and C: no two can be told apart',
    );
  });

  it('never claim certainty', () => {
    expect(probabilityWords(1, format())).toBe('> 0.99');
    expect(probabilityWords(0, format())).toBe('< 0.01');
    expect(probabilityWords(0.5, format())).toBe('0.50');
  });

  it('say which item of the condition kept a result out', () => {
    const fixed = viewOf().stayedOut.find(({ resultId }) => resultId === 'r-fixed');
    expect(fixed && exclusionReasons(fixed, format(), 'en-GB')).toBe(
      'not comparable with the reference condition: ground fixed floor, not one belt',
    );
  });
});

describe('what is taken along', () => {
  it('holds plain numbers with every digit, and no text that a spreadsheet would run', () => {
    const scenario = fiveVariants();
    const [first, ...others] = scenario.inputs.variants;
    const variants = [{ ...first!, name: '=HYPERLINK("x")' }, ...others];
    const view = viewOf({}, { ...scenario, inputs: { ...scenario.inputs, variants } });
    const [head, row] = csvText(rankingRows(view, new Map([['liftback', 0.75]]))).split('\r\n');
    expect(head).toContain('drag area in m²');
    expect(row).toMatch(/^1,"'=HYPERLINK\(""x""\)",0\.\d{8,}/);
    expect(row).toContain(`,${view.rows[0]?.figure.dragAreaM2},`);
    expect(row).toContain(',0.75,');
  });
});

describe('a derivation without the raw evidence', () => {
  it('holds steps by name and result, the budget, and no reading', () => {
    const view = viewOf();
    const [row] = view.rows;
    const derivation = row && outlineDerivation('own-area', row, view, format());
    expect(derivation?.steps.map(({ title }) => title)).toEqual([
      'Drag area at full scale',
      'Coefficient on its own frontal area',
    ]);
    expect(derivation?.budget.some(({ label }) => label === 'facility bias, Halmere belt tunnel')).toBe(true);
    expect(derivation?.budget.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
  });

  it('goes on from the drag area to the energy at the wheel', () => {
    const view = viewOf();
    const [row] = view.rows;
    const titles = row && closingSteps('energy', row, view, format()).map(({ title }) => title);
    expect(titles).toEqual(['Road load', 'Energy at the wheel over the distance']);
  });
});
