import { airOf } from '#shared/core/air/air';
import { dynamicViscosity, speedOfSound } from '#shared/core/air/gas-properties';
import { moistAirDensity } from '#shared/core/air/moist-air';
import { CELSIUS_ZERO_K, COVERAGE_PROBABILITY, KMH_PER_MS } from '#shared/core/constants';
import type { FacilityInput, RankingInput } from '#shared/core/ranking/ranking-input';
import { windNodes } from '#shared/core/reduction/yaw/wind-average';
import { skinFriction } from '#shared/core/similarity/skin-friction';
import { studentQuantile } from '#shared/core/uncertainty/student';
import { BENCH_ANGLES_DEG, BENCH_READINGS } from './reduction-programme';

/** What of a facility the arithmetic needs. */
interface BareFacility {
  readonly areaM2: number;
  readonly isAreaRatio: boolean;
  readonly factor: number;
  readonly fraction: number;
  readonly bias: number;
  readonly session: number;
  readonly inverseSessionNu: number;
  readonly installation: number;
  readonly inverseInstallationNu: number;
}

function bareFacility(facility: FacilityInput): BareFacility {
  return {
    areaM2: facility.areaM2 ?? NaN,
    isAreaRatio: facility.blockage?.method === 'area-ratio',
    factor: facility.blockage?.factor ?? NaN,
    fraction: facility.blockage?.uFractionOfCorrection ?? 0,
    bias: facility.biasURelative ?? 0,
    session: facility.sessionURelative ?? 0,
    inverseSessionNu: 1 / (facility.sessionDegreesOfFreedom ?? Infinity),
    installation: facility.installationURelative ?? 0,
    inverseInstallationNu: 1 / (facility.installationDegreesOfFreedom ?? Infinity),
  };
}

const ANGLES = BENCH_ANGLES_DEG.length;
/** Folded: 0, and each pair. */
const FOLDED = (ANGLES + 1) / 2;

/** Interpolating slopes of three folded points, the value at 0 being even: the scheme of the method, written out. */
function slopesInto(slopes: Float64Array, x: Float64Array, y: Float64Array): void {
  const [h0, h1] = [(x[1] as number) - (x[0] as number), (x[2] as number) - (x[1] as number)];
  const [m0, m1] = [((y[1] as number) - (y[0] as number)) / h0, ((y[2] as number) - (y[1] as number)) / h1];
  slopes[0] = 0;
  const [w1, w2] = [2 * h1 + h0, h1 + 2 * h0];
  slopes[1] = m0 * m1 > 0 ? (w1 + w2) / (w1 / m0 + w2 / m1) : 0;
  const end = ((2 * h1 + h0) * m1 - h1 * m0) / (h1 + h0);
  const limited = Math.sign(m1) !== Math.sign(m0) && Math.abs(end) > 3 * Math.abs(m1) ? 3 * m1 : end;
  slopes[2] = Math.sign(end) !== Math.sign(m1) ? 0 : limited;
}

/**
 * The yardstick: the arithmetic of the whole reduction in one loop over typed arrays, with no object, key, text or refusal. It
 * answers the sum of everything that it works out, so that no compiler may leave the work out.
 */
export function bareReduction(input: RankingInput): () => number {
  const { programme } = input;
  const facilities = input.facilities.map(bareFacility);
  const facilityIndex = new Map(input.facilities.map(({ id }, i) => [id, i]));
  const area = new Map(input.variants.map((variant) => [variant.id, variant]));
  const column = (valueOf: (result: RankingInput['results'][number]) => number): Float64Array =>
    Float64Array.from(input.results, valueOf);
  const columns = {
    facility: column(({ facilityId }) => facilityIndex.get(facilityId) ?? NaN),
    scale: column(({ scale }) => scale ?? NaN),
    frontal: column(({ variantId }) => area.get(variantId)?.frontalAreaM2 ?? NaN),
    frontalU: column(({ variantId }) => area.get(variantId)?.frontalAreaUM2 ?? NaN),
    speed: column(({ speedKmh }) => speedKmh ?? NaN),
    temperature: column(({ air }) => air?.temperatureC ?? NaN),
    pressure: column(({ air }) => air?.pressurePa ?? NaN),
    humidity: column(({ air }) => air?.relativeHumidity ?? NaN),
  };
  const values = Float64Array.from(
    input.results.flatMap(({ points }) => (points ?? []).map((p) => p.value ?? NaN)),
  );
  const deviations = Float64Array.from(
    input.results.flatMap(({ points }) => (points ?? []).map((p) => p.s ?? NaN)),
  );
  const reference = airOf(programme.referenceAir);
  const referenceSpeed = programme.referenceSpeedKmh / KMH_PER_MS;
  const referenceReynolds =
    (referenceSpeed * programme.characteristicLengthM) / reference.kinematicViscosityM2S;
  const nodes = windNodes((programme.windSpeedMs ?? NaN) / referenceSpeed);
  const [share, shareU] = [
    programme.policies?.frictionShare ?? NaN,
    programme.policies?.frictionShareU ?? NaN,
  ];
  const nu = BENCH_READINGS - 1;
  const x = Float64Array.from([0, 5, 10]);
  const [y, u, foldedNu, slopes] = Array.from({ length: 4 }, () => new Float64Array(FOLDED)) as [
    Float64Array,
    Float64Array,
    Float64Array,
    Float64Array,
  ];

  /** k_ψ of the folded points. */
  function ratio(): number {
    slopesInto(slopes, x, y);
    let sum = 0;
    for (const { weight, yawDeg } of nodes) {
      const i = yawDeg > (x[1] as number) ? 1 : 0;
      const h = (x[i + 1] as number) - (x[i] as number);
      const t = (yawDeg - (x[i] as number)) / h;
      const m = ((y[i + 1] as number) - (y[i] as number)) / h;
      const [d0, d1] = [slopes[i] as number, slopes[i + 1] as number];
      sum += weight * ((y[i] as number) + h * t * (d0 + t * (3 * m - 2 * d0 - d1 + t * (d0 + d1 - 2 * m))));
    }
    return sum / nodes.length / (y[0] as number);
  }

  return () => {
    let total = 0;
    for (let r = 0; r < columns.scale.length; r++) {
      const place = facilities[columns.facility[r] as number] as BareFacility;
      const scale = columns.scale[r] as number;
      const frontal = columns.frontal[r] as number;
      const temperature = columns.temperature[r] as number;
      const density = moistAirDensity(
        temperature,
        columns.pressure[r] as number,
        columns.humidity[r] as number,
      );
      const kelvin = temperature + CELSIUS_ZERO_K;
      const speed = (columns.speed[r] as number) / KMH_PER_MS;
      const reynolds = (speed * programme.characteristicLengthM * scale * density) / dynamicViscosity(kelvin);
      const mach = speed / speedOfSound(kelvin);
      const beta = (scale * scale * frontal) / place.areaM2;
      const blockage = place.isAreaRatio ? 1 / (1 + beta / 4) ** 2 : 1 / place.factor;
      const perValue = frontal * blockage;
      const at = r * ANGLES;
      for (let i = 0; i < FOLDED; i++) {
        const first = at + (i === 0 ? 0 : 2 * i - 1);
        const ua = ((deviations[first] as number) / Math.sqrt(BENCH_READINGS)) * perValue;
        if (i === 0) {
          y[0] = (values[first] as number) * perValue;
          u[0] = ua;
          foldedNu[0] = nu;
          continue;
        }
        const ub = ((deviations[first + 1] as number) / Math.sqrt(BENCH_READINGS)) * perValue;
        y[i] = (((values[first] as number) + (values[first + 1] as number)) * perValue) / 2;
        u[i] = Math.hypot(ua / 2, ub / 2);
        foldedNu[i] = (u[i] as number) ** 4 / (((ua / 2) ** 4 + (ub / 2) ** 4) / nu);
      }
      const fullScale = y[0] as number;
      const uncorrected = fullScale / blockage;
      const change = skinFriction(reynolds) / skinFriction(referenceReynolds) - 1;
      const bracket = 1 + share * change;
      const drag = fullScale / bracket;
      const method = (place.fraction * (fullScale - uncorrected)) / bracket;
      const throughArea = place.isAreaRatio
        ? (-fullScale * scale * scale * (columns.frontalU[r] as number)) /
          (2 * place.areaM2 * (1 + beta / 4)) /
          bracket
        : 0;
      const bias = (place.bias * fullScale) / bracket;
      const repeatability = (u[0] as number) / bracket;
      const session = (place.session * fullScale) / bracket;
      const installation = (place.installation * fullScale) / bracket;
      const shared = ((-fullScale * change) / bracket ** 2) * shareU;
      const shape = (drag - fullScale) / 2;
      const others =
        method ** 2 +
        throughArea ** 2 +
        bias ** 2 +
        session ** 2 +
        installation ** 2 +
        shared ** 2 +
        shape ** 2;
      const variance = others + repeatability ** 2;
      const denominator =
        repeatability ** 4 / nu +
        session ** 4 * place.inverseSessionNu +
        installation ** 4 * place.inverseInstallationNu;
      const expanded =
        studentQuantile(COVERAGE_PROBABILITY, (variance * variance) / denominator) * Math.sqrt(variance);

      const yawRatio = ratio();
      let zeroAmount = 0;
      let otherSquares = 0;
      let otherFourths = 0;
      for (let i = 0; i < FOLDED; i++) {
        const value = y[i] as number;
        y[i] = value + (u[i] as number);
        const above = ratio();
        y[i] = value - (u[i] as number);
        const amount = (above - ratio()) / 2;
        y[i] = value;
        if (i === 0) zeroAmount = amount;
        else {
          otherSquares += amount * amount;
          otherFourths += amount ** 4 / (foldedNu[i] as number);
        }
      }
      const windVariance =
        others * yawRatio ** 2 +
        (repeatability * yawRatio + drag * zeroAmount) ** 2 +
        drag * drag * otherSquares;
      total +=
        drag +
        expanded +
        drag * yawRatio +
        Math.sqrt(windVariance) +
        mach +
        1e-9 * reynolds +
        1e-6 * ((otherSquares * otherSquares) / otherFourths);
    }
    return total;
  };
}
