import type { BODY_SHAPES } from '#shared/contracts/variants';
import type { BodyDimensions } from '../../ui/picture/silhouette';

interface Measured {
  readonly bodyShape: (typeof BODY_SHAPES)[number];
  readonly lengthMm?: number | null;
  readonly heightMm?: number | null;
  readonly wheelbaseMm?: number | null;
}

/** A common car's size, where a dimension is not typed yet: only for the picture, never for a figure. */
const LENGTH_MM = 4300;
const HEIGHT_OVER_LENGTH = 0.34;
const WHEELBASE_OVER_LENGTH = 0.6;

export function bodyDimensions({ bodyShape, lengthMm, heightMm, wheelbaseMm }: Measured): BodyDimensions {
  const length = lengthMm ?? LENGTH_MM;
  return {
    bodyShape,
    lengthMm: length,
    heightMm: heightMm ?? length * HEIGHT_OVER_LENGTH,
    wheelbaseMm: wheelbaseMm ?? length * WHEELBASE_OVER_LENGTH,
  };
}
