import type { Configuration, FrontalArea } from '#shared/contracts/variants';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';

export const AREA_METHOD_WORDS: Readonly<Record<FrontalArea['method'], string>> = {
  'projected-image': $localize`projected image`,
  laser: $localize`laser`,
  cad: $localize`CAD`,
  estimate: $localize`estimate`,
};

/** The frontal area as it stands: the newest by date counts. */
export function standingArea<Area extends Pick<FrontalArea, 'date'>>(
  areas: readonly Area[],
): Area | undefined {
  return areas.reduce<Area | undefined>(
    (newest, area) => (newest === undefined || area.date > newest.date ? area : newest),
    undefined,
  );
}

type Named = Pick<Configuration, 'name' | 'massKg' | 'rollingResistance' | 'salesShare'> & {
  readonly roadLoadReference?: unknown;
  readonly electric?: unknown;
  readonly combustion?: unknown;
};

/** One configuration in a line: `Base, 1385 kg, electric, road load measured, 60 % of sales`. */
export function configurationWords(each: Named, format: QuantityFormat): string {
  const drive = [
    each.electric === undefined ? '' : $localize`electric`,
    each.combustion === undefined ? '' : $localize`combustion`,
  ].filter((word) => word !== '');
  return [
    each.name,
    format.text(each.massKg, 'mass'),
    ...drive,
    each.roadLoadReference === undefined ? '' : $localize`road load measured`,
    each.salesShare > 0 ? $localize`${format.text(each.salesShare * 100, 'percent')}:SHARE: of sales` : '',
  ]
    .filter((part) => part !== '')
    .join(', ');
}
