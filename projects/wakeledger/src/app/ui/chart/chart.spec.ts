import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Chart } from './chart';
import { fileNameOf, svgAddress } from './chart-export';
import { ECHARTS_LOADER } from './echarts-loader';

describe('a chart', () => {
  const setOption = jest.fn();
  const init = jest.fn((..._given: unknown[]) => ({
    setOption,
    on: jest.fn(),
    off: jest.fn(),
    resize: jest.fn(),
    dispose: jest.fn(),
    isDisposed: () => false,
    getWidth: () => 400,
    getHeight: () => 300,
  }));
  const draw = async (): Promise<HTMLElement> => {
    TestBed.configureTestingModule({
      providers: [{ provide: ECHARTS_LOADER, useValue: () => Promise.resolve({ init }) }],
    });
    const fixture = TestBed.createComponent(Chart, {
      bindings: [
        inputBinding('caption', signal('Speed over time')),
        inputBinding('options', signal({ tooltip: { trigger: 'axis' }, series: [] })),
        inputBinding('table', signal({ columns: ['Time in s', 'Speed in km/h'], rows: [['0', '12.5']] })),
      ],
    });
    fixture.detectChanges();
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  };

  it('has its table behind it', async () => {
    const host = await draw();
    expect(host.querySelector('table')).toBeNull();
    const opener = host.querySelector<HTMLElement>('[aria-expanded]');
    opener?.click();
    TestBed.tick();
    expect(Array.from(host.querySelectorAll('td'), (cell) => cell.textContent)).toEqual(['0', '12.5']);
    expect(opener?.getAttribute('aria-expanded')).toBe('true');
  });

  it('hands the inks to options that ask for them', async () => {
    TestBed.configureTestingModule({
      providers: [{ provide: ECHARTS_LOADER, useValue: () => Promise.resolve({ init }) }],
    });
    const options = jest.fn(() => ({ series: [] }));
    const fixture = TestBed.createComponent(Chart, {
      bindings: [
        inputBinding('caption', signal('Speed over time')),
        inputBinding('options', signal(options)),
        inputBinding('table', signal({ columns: [], rows: [] })),
      ],
    });
    fixture.detectChanges();
    await fixture.whenStable();
    expect(options).toHaveBeenCalledWith(expect.objectContaining({ rust: expect.any(String) }));
  });

  it('is named by its caption', async () => {
    const host = await draw();
    expect(host.querySelector('[role="img"]')?.getAttribute('aria-label')).toBe('Speed over time');
  });

  it('gets a file name that every system takes', () => {
    expect(fileNameOf('Dunlin: C_D·A (m²) / Größe', 'svg')).toMatch(/^dunlin-c-d-a-m2-gro.*e\.svg$/);
    expect(fileNameOf('…', 'png')).toBe('chart.png');
  });

  it('keeps signs beyond ASCII in the saved drawing', () => {
    expect(decodeURIComponent(svgAddress('<svg>m²</svg>'))).toContain('m²');
  });
});
