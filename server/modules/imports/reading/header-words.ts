import type { ImportField } from '#shared/contracts/import-fields';

/** Names that are set apart by commas. */
const names = (list: string): readonly string[] => list.split(',').map((name) => name.trim());

/**
 * Headings by which each field goes, in the words of the trade, English and German, normalised: lower case, umlauts
 * spelled out, nothing but letters, digits and single spaces. Earlier ones are surer.
 */
export const HEADER_WORDS: Readonly<Record<ImportField, readonly string[]>> = {
  name: names(`run, run number, run no, run id, result, name, label, point id, test no, test number, test id,
    measurement, messung, messung nr, messnummer, lauf, laufnummer, versuch, versuchsnummer, versuch
    nr, bezeichnung, id, nr, no`),
  variant: names(`variant, body variant, variante, body, configuration, config, vehicle, car, fahrzeug,
    karosserie, aufbau, geometry, shape, derivative, modellvariante`),
  facility: names(`facility, tunnel, wind tunnel, windkanal, kanal, anlage, test facility, solver set up,
    simulation set up, proving ground, pruefgelaende, pruefstand`),
  session: names('session, test session, campaign, kampagne, messkampagne, entry, block'),
  installation: names('installation, set up, setup, einbau, aufspannung'),
  testDate:
    names(`date, test date, datum, messdatum, pruefdatum, versuchsdatum, day, tag, date of test, run date,
    timestamp`),
  dragCoefficient:
    names(`cd, c d, cw, c w, cx, c x, drag coefficient, coefficient of drag, cw wert, widerstandsbeiwert,
    luftwiderstandsbeiwert, coefficient`),
  dragForce: names(`drag, drag force, f, fd, f d, fx, f x, force, fw, kraft, widerstand, widerstandskraft,
    luftwiderstand, force x, x force`),
  dragArea:
    names(`cda, cd a, c d a, cdxa, cd x a, drag area, cwa, cw a, c w a, cwxa, cw x a, scx, s cx, cxs, cx s,
    c d x a, c w x a, widerstandsflaeche, luftwiderstandsflaeche`),
  coastdownF2: names('f2, f 2, coastdown f2, road load f2, fahrwiderstand f2, ausroll f2'),
  quotedArea: names(`a, a ref, aref, reference area, ref area, quoted area, frontal area, area, bezugsflaeche,
    referenzflaeche, stirnflaeche, flaeche, a q, s ref`),
  quotedAreaU:
    names(`u a, ua, area uncertainty, u area, uncertainty of area, unsicherheit flaeche, reference area u,
    quoted area u`),
  quotedAreaScale:
    names(`area scale, area at, area basis, quoted area scale, flaeche bezogen auf, flaechenbasis, area is
    of`),
  scale: names('scale, model scale, massstab, modellmassstab'),
  speed: names(`speed, velocity, v, u, v inf, u inf, uinf, vinf, wind speed, air speed, airspeed, test speed,
    geschwindigkeit, windgeschwindigkeit, anstroemgeschwindigkeit`),
  dynamicPressure: names('q, q inf, qinf, dynamic pressure, staudruck, dyn pressure'),
  airState: names('air state, air, reference air, luftzustand, bezugszustand, air standard'),
  temperature:
    names(`temperature, temp, t, t air, air temperature, temperatur, lufttemperatur, static temperature, t
    inf`),
  pressure:
    names(`pressure, p, p static, static pressure, barometer, barometric pressure, ambient pressure, air
    pressure, druck, luftdruck, statischer druck, umgebungsdruck, p atm, p inf, p amb`),
  humidity:
    names(`humidity, relative humidity, rh, rel humidity, feuchte, luftfeuchte, luftfeuchtigkeit, relative
    feuchte, rel feuchte, phi`),
  yaw: names(`yaw, yaw angle, beta, psi, schiebewinkel, gierwinkel, anstroemwinkel, crosswind angle, yaw deg
`),
  s: names('s, standard deviation, std, sd, stdev, std dev, sigma, standardabweichung, s single'),
  n: names(`n, readings, repeats, number of readings, count, samples, anzahl, wiederholungen, n readings
`),
  tare: names('tare, tare force, tara, f tare, nullkraft, leerkraft'),
  tareAlreadySubtracted:
    names(`tare subtracted, tare already subtracted, tare removed, tara abgezogen, tara korrigiert, tare
    corrected`),
  frontLift:
    names(`front lift, clf, cl front, c l front, lift front, fzf, f z front, auftrieb vorn, auftrieb va, ca
    v, cl f`),
  rearLift:
    names(`rear lift, clr, cl rear, c l rear, lift rear, fzr, f z rear, auftrieb hinten, auftrieb ha, ca h,
    cl r`),
  sideForce: names('side force, cy, c y, cs, fy, f y, lateral force, seitenkraft'),
  expandedU:
    names(`expanded uncertainty, uncertainty, unsicherheit, erweiterte unsicherheit, messunsicherheit, u
    expanded, u95, u 95, expanded u`),
  k: names('k, coverage factor, erweiterungsfaktor'),
  degreesOfFreedom: names('degrees of freedom, dof, nu, freiheitsgrade'),
  includesFacilityBias: names('includes facility bias, bias included, systematik enthalten'),
  ground: names('ground, ground simulation, floor, boden, bodensimulation, belt'),
  wheels: names('wheels, wheel rotation, raeder, raddrehung'),
  cooling: names('cooling, cooling air, kuehlung, kuehlluft, grille'),
  mirrors: names('mirrors, spiegel, aussenspiegel'),
  rideHeightFront:
    names(`ride height front, front ride height, rhf, rh f, hoehenstand vorn, standhoehe vorn, hoehenstand
    va`),
  rideHeightRear: names(`ride height rear, rear ride height, rhr, rh r, hoehenstand hinten, standhoehe hinten,
    hoehenstand ha`),
  payload: names('payload, load, zuladung, beladung'),
  tyres: names('tyres, tyre, tires, tire, reifen, bereifung'),
  beltSpeedRatio: names('belt speed ratio, belt ratio, bandgeschwindigkeit, bandverhaeltnis'),
  wheelVentilationInForce:
    names(`wheel ventilation in force, ventilation included, ventilation in f, ventilationswiderstand
    enthalten`),
  turbulenceGenerationOrTrips: names(
    'turbulence generation, trips, turbulence, turbulenzerzeugung, stolperdraehte',
  ),
  blockageAlreadyCorrectedBy:
    names(`blockage corrected by, blockage correction, blockage corrected, versperrung korrigiert,
    versperrungskorrektur`),
  model: names('model, model id, modell, modellnummer, clay, buck'),
  source: names('source, quelle, reference, report, bericht, paper, publication'),
  remark: names(`remark, remarks, comment, comments, note, notes, bemerkung, bemerkungen, kommentar, notiz,
    anmerkung`),
};
