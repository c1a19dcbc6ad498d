import { CELSIUS_ZERO_K } from '#shared/core/constants';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { reynoldsWords, speedWords } from './plan-words';
import type { WayOut } from './ways-out';

export interface WayInWords {
  readonly title: string;
  readonly sentences: readonly string[];
  /** How far it holds. */
  readonly validity: string | undefined;
  /** What trying it does; absent where it cannot be tried. */
  readonly tryIt: string | undefined;
}

type Of<Kind extends WayOut['kind']> = Extract<WayOut, { readonly kind: Kind }>;

const GAS_WORDS = { air: $localize`air`, nitrogen: $localize`nitrogen` } as const;

/** One way out in words, with its own number. */
export function wayInWords(way: WayOut, format: QuantityFormat): WayInWords {
  switch (way.kind) {
    case 'smaller':
      return smallerWords(way, format);
    case 'scale':
      return scaleWords(way, format);
    case 'pressure':
      return pressureWords(way, format);
    case 'temperature':
      return temperatureWords(way, format);
    case 'sweep':
      return sweepWords(way, format);
    case 'turbulence':
      return turbulenceWords(way, format);
  }
}

const scaleText = (scale: number, format: QuantityFormat): string =>
  format.value(scale, 'number', { digits: 3 });

function smallerWords({ scale, limit }: Of<'smaller'>, format: QuantityFormat): WayInWords {
  const text = scaleText(scale, format);
  const percent = format.text(100 * limit, 'percent', { digits: 0 });
  return {
    title: $localize`A smaller model: scale ${text}:SCALE:`,
    sentences: [
      $localize`Then it fills ${percent}:LIMIT: of the section, the most that is accepted. It needs a higher speed for the same Reynolds number. A larger facility does the same without that.`,
    ],
    validity: undefined,
    tryIt: $localize`Try scale ${text}:SCALE:`,
  };
}

function scaleWords({ scale, blockage, trial }: Of<'scale'>, format: QuantityFormat): WayInWords {
  if (scale === null || blockage === null) {
    return {
      title: $localize`A larger model: not enough`,
      sentences: [$localize`It would have to be larger than the vehicle itself.`],
      validity: undefined,
      tryIt: undefined,
    };
  }
  const ratio = format.text(100 * blockage.ratio, 'percent', { digits: 1 });
  const words = {
    passes: $localize`It would fill ${ratio}:BLOCKAGE: of the section, within the limits.`,
    caution: $localize`It would fill ${ratio}:BLOCKAGE: of the section, which is a caution.`,
    excluded: $localize`It would fill ${ratio}:BLOCKAGE: of the section, which is too much: it needs a larger facility as well.`,
  };
  const text = scaleText(scale, format);
  return {
    title: $localize`A larger model: scale ${text}:SCALE:`,
    sentences: [words[blockage.verdict]],
    validity: undefined,
    tryIt: trial && $localize`Try scale ${text}:SCALE:`,
  };
}

function pressureWords({ ratio, pressurePa, trial }: Of<'pressure'>, format: QuantityFormat): WayInWords {
  const pressure = format.text(pressurePa / 1000, 'number', { digits: 1 });
  const times = format.value(ratio, 'number', { digits: 2 });
  return {
    title: $localize`More pressure: ${pressure}:PRESSURE: kPa`,
    sentences: [
      $localize`${times}:RATIO: times the planned pressure, at the planned temperature. The drag force rises by the same factor. It needs a pressurised plant.`,
    ],
    validity: $localize`Computed for air as an ideal gas.`,
    tryIt: trial && $localize`Try ${pressure}:PRESSURE: kPa`,
  };
}

function temperatureWords(way: Of<'temperature'>, format: QuantityFormat): WayInWords {
  const gas = GAS_WORDS[way.gas];
  const { temperatureK, coldest, trial } = way;
  const degrees = (celsius: number): string => format.text(celsius, 'temperature', { digits: 1 });
  const title =
    temperatureK === null
      ? $localize`A colder gas: not enough`
      : $localize`A colder gas: ${gas}:GAS: at ${format.value(temperatureK, 'number', { digits: 0 })}:KELVIN: K (${degrees(temperatureK - CELSIUS_ZERO_K)}:CELSIUS:)`;
  const needs =
    temperatureK === null
      ? $localize`With ${gas}:GAS: it would take less than 100 K, and nothing is said of that.`
      : $localize`At the planned pressure and the same Mach number.`;
  return {
    title,
    sentences: [
      needs,
      ...(coldest
        ? [
            $localize`That takes a cryogenic plant. The coldest air that can be tried here, ${degrees(coldest.temperatureC)}:CELSIUS:, gives a Reynolds number of ${reynoldsWords(coldest.reynolds, format)}:REYNOLDS:.`,
          ]
        : []),
    ],
    validity: $localize`Computed for ${gas}:GAS: as an ideal gas with Sutherland’s viscosity; nothing below 100 K.`,
    tryIt:
      trial?.tunnelTemperatureC === undefined
        ? undefined
        : $localize`Try ${degrees(trial.tunnelTemperatureC)}:CELSIUS:`,
  };
}

function sweepWords(way: Of<'sweep'>, format: QuantityFormat): WayInWords {
  const { sweep, sweepSpeedKmh, fromKmh, toKmh, upToReynolds } = way;
  if (sweep && sweepSpeedKmh !== undefined) {
    const lowest = reynoldsWords(sweep.lowestReynolds, format);
    const tolerance = format.text(sweep.toleranceM2, 'drag-area');
    return {
      title: $localize`A measured sweep: accept ${lowest}:REYNOLDS:`,
      sentences: [
        $localize`The sweep of ${sweep.name}:NAME: says that from there on the drag area stays within ${tolerance}:TOLERANCE: of that at the target. That is ${speedWords(sweepSpeedKmh, format)}:SPEED: here.`,
      ],
      validity: $localize`It holds for the shape that was swept.`,
      tryIt: $localize`Try ${lowest}:REYNOLDS:`,
    };
  }
  const reached = reynoldsWords(upToReynolds, format);
  return {
    title: $localize`A sweep that shows flatness: up to ${reached}:REYNOLDS:`,
    sentences: [
      $localize`No sweep of this variant is in yet. Measure the drag at four speeds or more between ${speedWords(fromKmh, format)}:FROM: and ${speedWords(toKmh, format)}:TO:, or from lower on: if it no longer changes with the Reynolds number, the lower one can be accepted.`,
    ],
    validity: $localize`A sweep that is not flat says by how much the figure has to be moved instead.`,
    tryIt: $localize`Try ${reached}:REYNOLDS: as the target`,
  };
}

function turbulenceWords(way: Of<'turbulence'>, format: QuantityFormat): WayInWords {
  const here = reynoldsWords(way.reynolds, format);
  const minimum = reynoldsWords(way.minimumReynolds, format);
  return {
    title: way.helps
      ? $localize`Added turbulence or trips: they help at ${here}:REYNOLDS:`
      : $localize`Added turbulence or trips: not needed at ${here}:REYNOLDS:`,
    sentences: [
      way.helps
        ? $localize`The model runs below ${minimum}:MINIMUM:, where its boundary layers may stay laminar too long. Turbulence or trips make them turbulent early.`
        : $localize`At the highest speed allowed the model runs above ${minimum}:MINIMUM:, where its boundary layers turn turbulent by themselves.`,
      $localize`They mimic a higher Reynolds number without matching it: the boundary layer stays too thick for its length, and separation and base pressure may still differ. They replace neither the target nor a sweep.`,
    ],
    validity: way.planned ? $localize`They are planned already.` : undefined,
    tryIt: way.trial && $localize`Plan with turbulence or trips`,
  };
}
