import { KMH_PER_MS, STANDARD_GRAVITY_M_PER_S2 } from '../constants';
import { refuse } from '../refusal';

/** Resistance F = f0 + f1·v + f2·v² with v in km/h and F in N. */
export interface RoadLoad {
  readonly f0N: number;
  readonly f1NPerKmh: number;
  readonly f2NPerKmh2: number;
}

/** A measured road load and the vehicle and air that it holds for. */
export interface RoadLoadReference extends RoadLoad {
  readonly massKg: number;
  readonly dragAreaM2: number;
  readonly airDensityKgM3: number;
}

/** What a vehicle brings to its road load; the drag area comes beside it, because it is what is compared. */
export interface RoadLoadVehicle {
  readonly massKg: number;
  /** C_rr, dimensionless. Needed where there is no reference. */
  readonly rollingResistance?: number | null | undefined;
  readonly roadLoadReference?: RoadLoadReference | null | undefined;
}

/**
 * The quadratic coefficient f2 [N/(km/h)²] that a drag area [m²] makes in air of a density [kg/m³]:
 * f2 = ½·ρ·CdA/3.6².
 */
export function f2OfDragArea(dragAreaM2: number, airDensityKgM3: number): number {
  return (0.5 * airDensityKgM3 * dragAreaM2) / (KMH_PER_MS * KMH_PER_MS);
}

/**
 * The drag area [m²] that a whole f2 [N/(km/h)²] would stand for. An upper bound of the real one: f2 also holds the
 * losses of tyres and driveline that grow with speed.
 */
export function dragAreaOfF2(f2NPerKmh2: number, airDensityKgM3: number): number {
  return (2 * KMH_PER_MS * KMH_PER_MS * f2NPerKmh2) / airDensityKgM3;
}

function measuredRoadLoad(
  vehicle: RoadLoadVehicle,
  reference: RoadLoadReference,
  dragAreaM2: number,
  airDensityKgM3: number,
): RoadLoad {
  const { rollingResistance, massKg } = vehicle;
  const f0N =
    rollingResistance == null
      ? (reference.f0N * massKg) / reference.massKg
      : reference.f0N + (massKg - reference.massKg) * STANDARD_GRAVITY_M_PER_S2 * rollingResistance;
  const difference = airDensityKgM3 * dragAreaM2 - reference.airDensityKgM3 * reference.dragAreaM2;
  const f2NPerKmh2 = reference.f2NPerKmh2 + difference / (2 * KMH_PER_MS * KMH_PER_MS);
  return { f0N, f1NPerKmh: reference.f1NPerKmh, f2NPerKmh2 };
}

/**
 * Road load of a vehicle with a drag area [m²] in air of a density [kg/m³].
 *
 * Form (b), where the vehicle has a measured reference (f0₀, f1₀, f2₀ at CdA₀, m₀, ρ₀): f2 = f2₀ + (ρ·CdA − ρ₀·CdA₀)/(2·3.6²)
 * and f0 = f0₀ + (m − m₀)·g·C_rr, or f0₀·m/m₀ without C_rr. Form (a), where it has none: f0 = m·g·C_rr, f1 = 0,
 * f2 = ½·ρ·CdA/3.6². Source: method section 13; the road-load polynomial is that of UN GTR No. 15, Annex 4.
 *
 * @throws {Refused} missing-input (form (a) without C_rr)
 */
export function roadLoadOf(vehicle: RoadLoadVehicle, dragAreaM2: number, airDensityKgM3: number): RoadLoad {
  const { roadLoadReference, rollingResistance, massKg } = vehicle;
  if (roadLoadReference != null) {
    return measuredRoadLoad(vehicle, roadLoadReference, dragAreaM2, airDensityKgM3);
  }
  if (rollingResistance == null) {
    refuse(
      'missing-input',
      'rollingResistance',
      'A vehicle without a measured road load needs a rolling resistance.',
    );
  }
  return {
    f0N: massKg * STANDARD_GRAVITY_M_PER_S2 * rollingResistance,
    f1NPerKmh: 0,
    f2NPerKmh2: f2OfDragArea(dragAreaM2, airDensityKgM3),
  };
}
