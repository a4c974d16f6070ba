package org.hullsum.units;

import java.util.Map;
import java.util.Optional;

/**
 * The International System of Units and the units used with it, by their UCUM symbols. Sizes are
 * exact by definition (SI Brochure, 9th edition, 2019; UCUM 2.1, tables 1 to 7) but for the few
 * that are measured.
 */
final class SystemUnits {
  static final Dimension AREA = Dimension.LENGTH.power(2);
  static final Dimension VOLUME = Dimension.LENGTH.power(3);
  static final Dimension FREQUENCY = Dimension.TIME.power(-1);
  static final Dimension SPEED = Dimension.LENGTH.times(FREQUENCY);
  static final Dimension ACCELERATION = SPEED.times(FREQUENCY);
  static final Dimension FORCE = Dimension.MASS.times(ACCELERATION);
  static final Dimension PRESSURE = FORCE.dividedBy(AREA);
  static final Dimension ENERGY = FORCE.times(Dimension.LENGTH);
  static final Dimension POWER = ENERGY.times(FREQUENCY);
  static final double ZERO_CELSIUS = 273.15;

  private static final Dimension CHARGE = Dimension.CURRENT.times(Dimension.TIME);
  private static final Dimension VOLTAGE = POWER.dividedBy(Dimension.CURRENT);
  private static final Dimension RESISTANCE = VOLTAGE.dividedBy(Dimension.CURRENT);
  private static final Dimension MAGNETIC_FLUX = VOLTAGE.times(Dimension.TIME);
  private static final Dimension DOSE = SPEED.power(2);

  private SystemUnits() {}

  static void addTo(Map<String, UnitAtom> atoms) {
    addMechanical(atoms);
    addElectrical(atoms);
    addTimes(atoms);
    addNumbers(atoms);
    addOthers(atoms);
  }

  private static void addMechanical(Map<String, UnitAtom> atoms) {
    metric(atoms, "m", 1, 0, Dimension.LENGTH);
    metric(atoms, "g", 1, -3, Dimension.MASS);
    metric(atoms, "s", 1, 0, Dimension.TIME);
    metric(atoms, "L", 1, -3, VOLUME);
    metric(atoms, "l", 1, -3, VOLUME);
    metric(atoms, "t", 1, 3, Dimension.MASS);
    metric(atoms, "Hz", 1, 0, FREQUENCY);
    metric(atoms, "N", 1, 0, FORCE);
    metric(atoms, "Pa", 1, 0, PRESSURE);
    metric(atoms, "bar", 1, 5, PRESSURE);
    metric(atoms, "J", 1, 0, ENERGY);
    metric(atoms, "W", 1, 0, POWER);
    metric(atoms, "K", 1, 0, Dimension.TEMPERATURE);
    metric(atoms, "mol", 1, 0, Dimension.AMOUNT);
    metric(atoms, "gf", 980665, -8, FORCE);
    metric(atoms, "dyn", 1, -5, FORCE);
    metric(atoms, "erg", 1, -7, ENERGY);
    metric(atoms, "P", 1, -1, PRESSURE.times(Dimension.TIME));
    metric(atoms, "St", 1, -4, AREA.times(FREQUENCY));
    metric(atoms, "ar", 1, 2, AREA);
    metric(atoms, "[g]", 980665, -5, ACCELERATION);
    plain(atoms, "Cel", new UnitTerm(Magnitude.ONE, Dimension.TEMPERATURE, ZERO_CELSIUS));
  }

  private static void addElectrical(Map<String, UnitAtom> atoms) {
    metric(atoms, "A", 1, 0, Dimension.CURRENT);
    metric(atoms, "C", 1, 0, CHARGE);
    metric(atoms, "V", 1, 0, VOLTAGE);
    metric(atoms, "Ohm", 1, 0, RESISTANCE);
    metric(atoms, "S", 1, 0, RESISTANCE.power(-1));
    metric(atoms, "F", 1, 0, CHARGE.dividedBy(VOLTAGE));
    metric(atoms, "Wb", 1, 0, MAGNETIC_FLUX);
    metric(atoms, "T", 1, 0, MAGNETIC_FLUX.dividedBy(AREA));
    metric(atoms, "H", 1, 0, MAGNETIC_FLUX.dividedBy(Dimension.CURRENT));
    metric(atoms, "G", 1, -4, MAGNETIC_FLUX.dividedBy(AREA));
    metric(atoms, "eV", 1_602_176_634, -28, ENERGY);
    metric(atoms, "[e]", 1_602_176_634, -28, CHARGE);
  }

  private static void addTimes(Map<String, UnitAtom> atoms) {
    plain(atoms, "min", UnitTerm.of(60, 0, Dimension.TIME));
    plain(atoms, "h", UnitTerm.of(3600, 0, Dimension.TIME));
    plain(atoms, "d", UnitTerm.of(86_400, 0, Dimension.TIME));
    plain(atoms, "wk", UnitTerm.of(604_800, 0, Dimension.TIME));
    plain(atoms, "mo", UnitTerm.of(2_629_800, 0, Dimension.TIME));
    plain(atoms, "mo_j", UnitTerm.of(2_629_800, 0, Dimension.TIME));
    plain(atoms, "mo_g", UnitTerm.of(2_629_746, 0, Dimension.TIME));
    plain(atoms, "a", UnitTerm.of(31_557_600, 0, Dimension.TIME));
    plain(atoms, "a_j", UnitTerm.of(31_557_600, 0, Dimension.TIME));
    plain(atoms, "a_g", UnitTerm.of(31_556_952, 0, Dimension.TIME));
  }

  private static void addNumbers(Map<String, UnitAtom> atoms) {
    metric(atoms, "rad", 1, 0, Dimension.NONE);
    metric(atoms, "sr", 1, 0, Dimension.NONE);
    plain(atoms, "deg", angle(180));
    plain(atoms, "gon", angle(200));
    plain(atoms, "circ", angle(0.5));
    plain(atoms, "[pi]", UnitTerm.of(Math.PI, 0, Dimension.NONE));
    plain(atoms, "%", UnitTerm.of(1, -2, Dimension.NONE));
    plain(atoms, "[ppth]", UnitTerm.of(1, -3, Dimension.NONE));
    plain(atoms, "[ppm]", UnitTerm.of(1, -6, Dimension.NONE));
    plain(atoms, "[ppb]", UnitTerm.of(1, -9, Dimension.NONE));
    plain(atoms, "[pptr]", UnitTerm.of(1, -12, Dimension.NONE));
  }

  private static void addOthers(Map<String, UnitAtom> atoms) {
    metric(atoms, "cd", 1, 0, Dimension.LUMINOUS_INTENSITY);
    metric(atoms, "lm", 1, 0, Dimension.LUMINOUS_INTENSITY);
    metric(atoms, "lx", 1, 0, Dimension.LUMINOUS_INTENSITY.dividedBy(AREA));
    metric(atoms, "Bq", 1, 0, FREQUENCY);
    metric(atoms, "Gy", 1, 0, DOSE);
    metric(atoms, "Sv", 1, 0, DOSE);
    metric(atoms, "kat", 1, 0, Dimension.AMOUNT.times(FREQUENCY));
    metric(atoms, "u", 166_053_906_660.0, -38, Dimension.MASS);
    plain(atoms, "Ao", UnitTerm.of(1, -10, Dimension.LENGTH));
    plain(atoms, "b", UnitTerm.of(1, -28, AREA));
    plain(atoms, "atm", UnitTerm.of(101_325, 0, PRESSURE));
    plain(atoms, "att", UnitTerm.of(980_665, -1, PRESSURE));
    metric(atoms, "m[H2O]", 980_665, -2, PRESSURE);
    metric(atoms, "m[Hg]", 133_322, 0, PRESSURE);
    metric(atoms, "cal", 4184, -3, ENERGY);
    metric(atoms, "cal_th", 4184, -3, ENERGY);
    metric(atoms, "cal_IT", 41_868, -4, ENERGY);
  }

  /** One half turn divided by {@code parts}, in radians. */
  private static UnitTerm angle(double parts) {
    return new UnitTerm(new Magnitude(Math.PI, parts, 0), Dimension.NONE, 0);
  }

  static void metric(
      Map<String, UnitAtom> atoms, String symbol, double size, int tens, Dimension dimension) {
    UnitTerm term = UnitTerm.of(size, tens, dimension);
    atoms.put(symbol, new UnitAtom(symbol, term, true, Optional.empty()));
  }

  static void plain(Map<String, UnitAtom> atoms, String symbol, UnitTerm term) {
    atoms.put(symbol, new UnitAtom(symbol, term, false, Optional.empty()));
  }
}
