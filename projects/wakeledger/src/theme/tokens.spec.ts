import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { COLOUR_TOKENS } from './token-values';

type Palette = Readonly<Record<string, string>>;

function palette(name: 'light' | 'dark'): Palette {
  const source = readFileSync(join(__dirname, '_tokens.scss'), 'utf8');
  const block = new RegExp(`\\$${name}: \\(([^)]*)\\)`).exec(source)?.[1] ?? '';
  return Object.fromEntries(
    [...block.matchAll(/(\w+): (#[0-9a-f]{6})/g)].map(([, token, value]) => [token, value]),
  );
}

/** Contrast ratio after WCAG 2.2, from relative luminance in sRGB. */
function contrast(one: string, other: string): number {
  const luminance = (hex: string): number => {
    const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
      const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
      return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
    });
    return 0.2126 * r + 0.7152 * g + 0.0722 * b;
  };
  const [darker = 0, lighter = 0] = [luminance(one), luminance(other)].toSorted((a, b) => a - b);
  return (lighter + 0.05) / (darker + 0.05);
}

describe.each(['light', 'dark'] as const)('the %s colours', (name) => {
  const colours = palette(name);
  const GROUNDS = ['paper', 'sheet', 'selected', 'hover', 'notice'];

  it('are all there', () => {
    expect(Object.keys(colours).toSorted()).toEqual([...COLOUR_TOKENS].toSorted());
  });

  it.each(['ink', 'petrol', 'ochre', 'moss', 'rust', 'plum'])(
    '%s can be read on every ground (4.5 to 1)',
    (ink) => {
      for (const ground of GROUNDS) {
        expect([ground, contrast(colours[ink]!, colours[ground]!) >= 4.5]).toEqual([ground, true]);
      }
    },
  );

  it('ink can be read on the band, the sheet’s colour on petrol', () => {
    expect(contrast(colours['ink']!, colours['band']!)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(colours['sheet']!, colours['petrol']!)).toBeGreaterThanOrEqual(4.5);
  });

  it('edge can be seen around an input (3 to 1)', () => {
    for (const ground of ['paper', 'sheet']) {
      expect(contrast(colours['edge']!, colours[ground]!)).toBeGreaterThanOrEqual(3);
    }
  });
});
