import { BODY_SHAPES } from '#shared/contracts/variants';
import { BODY_SHAPE_NAMES } from '../../ui/words/body-shape-words';

/** One limit as it is typed. What is held is the typed number times the factor: a fraction is typed in per cent. */
export interface LimitField {
  /** As the contract names it, dotted. */
  readonly path: string;
  readonly label: string;
  readonly unit: string;
  readonly factor: number;
  readonly minimum?: number;
  readonly maximum?: number;
}

/** Limits that belong to one check, with one sentence about what it does. */
export interface LimitRow {
  readonly name: string;
  readonly sentence: string;
  readonly fields: readonly LimitField[];
}

export interface LimitGroup {
  /** For links to it. */
  readonly id: string;
  readonly title: string;
  readonly rows: readonly LimitRow[];
}

const plain = (path: string, label: string, bounds: Partial<LimitField> = {}): LimitField => ({
  path,
  label,
  unit: '',
  factor: 1,
  ...bounds,
});
const percent = (path: string, label: string): LimitField =>
  plain(path, label, { unit: '%', factor: 0.01, minimum: 0, maximum: 100 });

const CAUTION = $localize`Caution above`;
const EXCLUDED = $localize`Excluded above`;
const FROM = $localize`From`;
const TO = $localize`To`;

/** Every limit but those per body shape, in the order of the page. */
export const LIMIT_GROUPS: readonly LimitGroup[] = [
  {
    id: 'flow',
    title: $localize`How the air flows`,
    rows: [
      {
        name: $localize`Mach number`,
        sentence: $localize`Fast air is compressed and drags otherwise than on the road.`,
        fields: [
          plain('machCaution', CAUTION, { minimum: 0.01, maximum: 1 }),
          plain('machExcluded', EXCLUDED, { minimum: 0.01, maximum: 1 }),
        ],
      },
      {
        name: $localize`Blockage, closed test section`,
        sentence: $localize`The larger the model in the tunnel, the more its walls squeeze the flow.`,
        fields: [percent('blockageCaution', CAUTION), percent('blockageExcluded', EXCLUDED)],
      },
      {
        name: $localize`Blockage, open jet`,
        sentence: $localize`A model that is too large for the nozzle is not surrounded by the jet.`,
        fields: [percent('openJetLimit', EXCLUDED)],
      },
    ],
  },
  {
    id: 'reynolds',
    title: $localize`Size and speed: the Reynolds number`,
    rows: [
      {
        name: $localize`Transition`,
        sentence: $localize`A scale model below this may have its flow turn turbulent in another place than the car, unless trips or a flat sweep settle it.`,
        fields: [
          plain('minimumReynolds', $localize`Caution below`, {
            unit: '× 10⁶',
            factor: 1e6,
            minimum: 0.01,
            maximum: 100,
          }),
        ],
      },
      {
        name: $localize`Tolerance`,
        sentence: $localize`A sweep within it counts as flat; a longer way that is only estimated is a caution.`,
        fields: [
          plain('reynoldsToleranceM2', $localize`Drag area`, { unit: 'm²', minimum: 0.0001, maximum: 1 }),
        ],
      },
      {
        name: $localize`Friction share`,
        sentence: $localize`How much of the drag is assumed to be skin friction where no sweep was measured. Every such figure moves with it.`,
        fields: [
          percent('frictionShare', $localize`Share of the drag`),
          percent('frictionShareU', $localize`Its standard uncertainty`),
        ],
      },
    ],
  },
  {
    id: 'readings',
    title: $localize`The readings`,
    rows: [
      {
        name: $localize`Repeatability`,
        sentence: $localize`Readings of one setting that scatter by more than this, relative to the drag, ask for a second look.`,
        fields: [percent('repeatabilityCaution', CAUTION)],
      },
      {
        name: $localize`Yaw coverage`,
        sentence: $localize`A sweep that reaches less far to both sides gives a wind average on fewer angles than you want.`,
        fields: [plain('yawCoverageDeg', $localize`Caution below`, { unit: '°', minimum: 0.1, maximum: 90 })],
      },
      {
        name: $localize`Lift`,
        sentence: $localize`Lift coefficients on the frontal area, upwards positive, above which a car becomes light on an axle.`,
        fields: [
          plain('frontLiftLimit', $localize`Front, caution above`, { minimum: -2, maximum: 2 }),
          plain('rearLiftLimit', $localize`Rear, caution above`, { minimum: -2, maximum: 2 }),
        ],
      },
    ],
  },
  {
    id: 'air',
    title: $localize`The air of a test hall`,
    rows: [
      {
        name: $localize`Temperature`,
        sentence: $localize`Outside it, a value was often typed in kelvin or degrees Fahrenheit.`,
        fields: [
          plain('airTemperatureC.from', FROM, { unit: '°C', minimum: -40, maximum: 60 }),
          plain('airTemperatureC.to', TO, { unit: '°C', minimum: -40, maximum: 60 }),
        ],
      },
      {
        name: $localize`Static pressure`,
        sentence: $localize`Outside it, a value was often typed in another unit; pressurised tunnels need a wider range.`,
        fields: [
          plain('airPressurePa.from', FROM, { unit: 'hPa', factor: 100, minimum: 300, maximum: 10000 }),
          plain('airPressurePa.to', TO, { unit: 'hPa', factor: 100, minimum: 300, maximum: 10000 }),
        ],
      },
    ],
  },
];

/** The limits of one body shape: four figures in a line of a table. */
export interface BodyRow {
  readonly shape: string;
  readonly fields: readonly LimitField[];
}

const BODY_FIGURES = [
  ['dragCoefficient.from', $localize`Drag coefficient from`, '', 2],
  ['dragCoefficient.to', $localize`Drag coefficient to`, '', 2],
  ['frontalAreaM2.from', $localize`Frontal area from`, 'm²', 20],
  ['frontalAreaM2.to', $localize`Frontal area to`, 'm²', 20],
] as const;

export const BODY_ROWS: readonly BodyRow[] = BODY_SHAPES.map((shape, position) => ({
  shape: BODY_SHAPE_NAMES[shape],
  fields: BODY_FIGURES.map(([figure, label, unit, maximum]) =>
    plain(`plausible.${position}.${figure}`, `${BODY_SHAPE_NAMES[shape]}: ${label}`, {
      unit,
      minimum: 0.01,
      maximum,
    }),
  ),
}));

/** Every single figure with the name under which a change of it is told. */
export const LIMIT_FIELDS: readonly LimitField[] = [
  ...LIMIT_GROUPS.flatMap(({ rows }) =>
    rows.flatMap(({ name, fields }) =>
      fields.map((field) => ({ ...field, label: `${name}: ${field.label.toLocaleLowerCase()}` })),
    ),
  ),
  ...BODY_ROWS.flatMap(({ fields }) => fields),
];
