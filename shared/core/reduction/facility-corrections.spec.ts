import { changedCorrections, type FacilityCorrections } from './facility-corrections';

const tunnel: FacilityCorrections = {
  kind: 'closed',
  areaM2: 24,
  blockage: { method: 'maskell', theta: 0.96, uFractionOfCorrection: 0.3 },
  biasURelative: 0.006,
};

describe('corrections of a facility', () => {
  it('are the same in whatever order a database returns them, and where nothing stands for nothing', () => {
    const again: FacilityCorrections = {
      biasURelative: 0.006,
      biasUM2: null,
      blockage: { uFractionOfCorrection: 0.3, theta: 0.96, factor: undefined, method: 'maskell' },
      areaM2: 24,
      kind: 'closed',
    };
    expect(changedCorrections(tunnel, again)).toEqual([]);
  });

  it('are named where they changed, came or went', () => {
    expect(
      changedCorrections(tunnel, {
        kind: 'closed',
        areaM2: 22,
        blockage: { method: 'maskell', theta: 1.1, uFractionOfCorrection: 0.3 },
        sessionUM2: 0,
      }),
    ).toEqual(['areaM2', 'blockage', 'biasURelative', 'sessionUM2']);
  });
});
