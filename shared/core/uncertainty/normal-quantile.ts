/**
 * Quantile of the standard normal distribution, algorithm AS 241 (routine PPND16), relative error about 1e-16.
 * Source: Wichura, Appl. Stat. 37 (1988) 477.
 *
 * @param p probability, 0 < p < 1; outside, the answer is not a number or infinite
 */
export function normalQuantile(p: number): number {
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) {
    const r = 0.180625 - q * q;
    return (q * centreNumerator(r)) / centreDenominator(r);
  }
  const r = Math.sqrt(-Math.log(q < 0 ? p : 1 - p));
  const magnitude =
    r <= 5
      ? middleNumerator(r - 1.6) / middleDenominator(r - 1.6)
      : tailNumerator(r - 5) / tailDenominator(r - 5);
  return q < 0 ? -magnitude : magnitude;
}

function centreNumerator(r: number): number {
  return (
    ((((((2509.0809287301226727 * r + 33430.575583588128105) * r + 67265.770927008700853) * r +
      45921.953931549871457) *
      r +
      13731.693765509461125) *
      r +
      1971.5909503065514427) *
      r +
      133.14166789178437745) *
      r +
    3.387132872796366608
  );
}

function centreDenominator(r: number): number {
  return (
    ((((((5226.495278852854561 * r + 28729.085735721942674) * r + 39307.89580009271061) * r +
      21213.794301586595867) *
      r +
      5394.1960214247511077) *
      r +
      687.1870074920579083) *
      r +
      42.313330701600911252) *
      r +
    1
  );
}

function middleNumerator(r: number): number {
  return (
    ((((((7.7454501427834140764e-4 * r + 2.27238449892691845833e-2) * r + 2.4178072517745061177e-1) * r +
      1.27045825245236838258) *
      r +
      3.64784832476320460504) *
      r +
      5.7694972214606914055) *
      r +
      4.6303378461565452959) *
      r +
    1.42343711074968357734
  );
}

function middleDenominator(r: number): number {
  return (
    ((((((1.05075007164441684324e-9 * r + 5.475938084995344946e-4) * r + 1.51986665636164571966e-2) * r +
      1.4810397642748007459e-1) *
      r +
      6.8976733498510000455e-1) *
      r +
      1.6763848301838038494) *
      r +
      2.05319162663775882187) *
      r +
    1
  );
}

function tailNumerator(r: number): number {
  return (
    ((((((2.01033439929228813265e-7 * r + 2.71155556874348757815e-5) * r + 1.2426609473880784386e-3) * r +
      2.6532189526576123093e-2) *
      r +
      2.9656057182850489123e-1) *
      r +
      1.7848265399172913358) *
      r +
      5.4637849111641143699) *
      r +
    6.6579046435011037772
  );
}

function tailDenominator(r: number): number {
  return (
    ((((((2.04426310338993978564e-15 * r + 1.4215117583164458887e-7) * r + 1.8463183175100546818e-5) * r +
      7.868691311456132591e-4) *
      r +
      1.48753612908506148525e-2) *
      r +
      1.3692988092273580531e-1) *
      r +
      5.9983220655588793769e-1) *
      r +
    1
  );
}
