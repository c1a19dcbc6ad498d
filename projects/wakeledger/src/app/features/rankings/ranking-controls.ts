import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import {
  LARGEST_CONSTANT_SPEED_KMH,
  constantCycleKey,
  constantSpeedOf,
} from '#shared/core/ranking/chosen-cycle';
import {
  DEFAULT_CHOICES,
  choicesOfQuery,
  queryOfChoices,
  type ChoiceName,
  type ChoiceQuery,
} from '#shared/core/ranking/ranking-choices';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { parseTypedNumber } from '../../core/numbers/parse-typed-number';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import {
  BASIS_OFFERS,
  CONSTANT_SPEED,
  CUSTOM_AIR,
  EVIDENCE_OFFERS,
  ORDER_OFFERS,
  TYPED_AREA,
  airOffers,
  areaOffers,
  confidenceOffers,
  configurationOffers,
  cycleOffers,
  type Offer,
} from './control-choices';
import { typedArea } from './typed-area';

interface Control {
  readonly name: ChoiceName;
  readonly label: string;
  readonly chosen: string;
  readonly offers: readonly Offer[];
}

/** The row of controls above the ranking. What is chosen goes into the address; the address decides what is shown. */
@Component({
  selector: 'wl-ranking-controls',
  templateUrl: './ranking-controls.html',
  styleUrl: './ranking-controls.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RankingControls {
  readonly view = input.required<RankingView>();
  /** The choices as they stand in the address. */
  readonly address = input.required<ChoiceQuery>();
  /** The whole new address, defaults left out. */
  readonly changed = output<ChoiceQuery>();

  private readonly format = inject(QuantityFormat);
  /** A control that asks for numbers of one's own, until they are there. */
  protected readonly asking = signal<'area' | 'air' | 'cycle' | null>(null);
  protected readonly mistake = signal<'area' | 'air' | 'cycle' | null>(null);

  private readonly choices = computed(() => choicesOfQuery(this.address()).choices);
  protected readonly areaAsked = computed(
    () => this.asking() === 'area' || this.choices().area.kind === 'typed',
  );
  private readonly constantSpeed = computed(() => constantSpeedOf(this.choices().cycle));
  protected readonly speedAsked = computed(() => this.asking() === 'cycle' || this.constantSpeed() !== null);
  private readonly statedAir = computed(() => {
    const { air } = this.choices();
    return air.kind === 'stated' && air.air.state === 'custom' ? air.air : null;
  });
  protected readonly airAsked = computed(() => this.asking() === 'air' || this.statedAir() !== null);
  protected readonly typed = computed(() => {
    const { area } = this.choices();
    const air = this.statedAir();
    return {
      area: area.kind === 'typed' ? String(area.areaM2) : '',
      speed: this.constantSpeed()?.toString() ?? '',
      temperature: air?.temperatureC?.toString() ?? '20',
      pressure: air?.pressurePa?.toString() ?? '100000',
      humidity: String(100 * (air?.relativeHumidity ?? 0.5)),
    };
  });

  protected readonly controls = computed((): readonly Control[] => {
    const view = this.view();
    const { offers } = view;
    const query = { ...queryOfChoices(DEFAULT_CHOICES), ...queryOfChoices(this.choices()) };
    const chosen = (name: ChoiceName, otherwise: string): string => query[name] ?? otherwise;
    return [
      this.control('order', $localize`Order by`, chosen('order', 'drag-area'), ORDER_OFFERS),
      this.control(
        'area',
        $localize`Reference area`,
        this.areaAsked() ? TYPED_AREA : chosen('area', 'programme'),
        areaOffers(offers, this.format),
      ),
      this.control('basis', $localize`Basis`, chosen('basis', 'zero-yaw'), BASIS_OFFERS),
      this.control('evidence', $localize`Evidence`, chosen('evidence', 'adopted'), EVIDENCE_OFFERS),
      this.control(
        'configuration',
        $localize`Configuration`,
        chosen('configuration', 'base'),
        configurationOffers(offers),
      ),
      this.control(
        'cycle',
        $localize`Energy on`,
        this.speedAsked() ? CONSTANT_SPEED : (view.cycle?.key ?? ''),
        cycleOffers(offers),
      ),
      this.control(
        'air',
        $localize`Air`,
        this.airAsked() ? CUSTOM_AIR : chosen('air', 'programme'),
        airOffers(offers, this.format),
      ),
      this.control(
        'confidence',
        $localize`Confidence`,
        String(view.confidence),
        confidenceOffers(offers, view.confidence, this.format),
      ),
    ];
  });

  constructor() {
    // An address that came from elsewhere (back, a link) settles what was being asked.
    effect(() => {
      this.address();
      this.asking.set(null);
      this.mistake.set(null);
    });
  }

  protected choose(name: ChoiceName, value: string): void {
    if (
      (name === 'area' && value === TYPED_AREA) ||
      (name === 'air' && value === CUSTOM_AIR) ||
      (name === 'cycle' && value === CONSTANT_SPEED)
    ) {
      this.asking.set(name);
      return;
    }
    this.asking.set(null);
    const ownConfidence = name === 'confidence' && Number(value) === this.view().offers.programmeConfidence;
    this.emit(name, ownConfidence ? undefined : value);
  }

  protected typeArea(text: string): void {
    const areaM2 = typedArea(text);
    if (areaM2 === null) this.mistake.set('area');
    else this.emit('area', String(areaM2));
  }

  protected typeSpeed(text: string): void {
    const read = parseTypedNumber(text, { minimum: 1, maximum: LARGEST_CONSTANT_SPEED_KMH });
    const key = read.kind === 'number' ? constantCycleKey(Number(read.value.toFixed(3))) : '';
    if (constantSpeedOf(key) === null) this.mistake.set('cycle');
    else this.emit('cycle', key);
  }

  protected typeAir(temperature: string, pressure: string, humidity: string): void {
    const read = [
      parseTypedNumber(temperature, { minimum: -40, maximum: 60 }),
      parseTypedNumber(pressure, { minimum: 3e4, maximum: 1e6 }),
      parseTypedNumber(humidity, { minimum: 0, maximum: 100 }),
    ];
    const values = read.flatMap((number) => (number.kind === 'number' ? [number.value] : []));
    const [celsius, pascals, percent] = values;
    if (
      celsius === undefined ||
      pascals === undefined ||
      percent === undefined ||
      !(celsius >= -40 && celsius <= 60 && pascals >= 3e4 && pascals <= 1e6 && percent >= 0 && percent <= 100)
    ) {
      this.mistake.set('air');
      return;
    }
    this.emit('air', `custom:${celsius}:${pascals}:${Number((percent / 100).toPrecision(9))}`);
  }

  private control(name: ChoiceName, label: string, chosen: string, offers: readonly Offer[]): Control {
    return { name, label, chosen, offers };
  }

  private emit(name: ChoiceName, value: string | undefined): void {
    this.mistake.set(null);
    const { choices } = choicesOfQuery({ ...this.address(), [name]: value });
    this.changed.emit(queryOfChoices(choices));
  }
}
