package org.hullsum.units;

import java.util.Map;

/**
 * The customary units of the United States and Britain, by their UCUM symbols. Sizes are exact by
 * the international yard and pound (1959), the US gallon of 231 cubic inches and the imperial
 * gallon of 4.54609 litres (NIST SP 811, 2008, appendix B), but for the surveyor's foot and the
 * British thermal unit of the thermochemical calorie.
 */
final class CustomaryUnits {
  private static final double FAHRENHEIT_ZERO = 459.67;

  private CustomaryUnits() {}

  static void addTo(Map<String, UnitAtom> atoms) {
    addLengths(atoms);
    addVolumes(atoms);
    addMasses(atoms);
    addForcesAndEnergies(atoms);
    addTemperatures(atoms);
  }

  private static void addLengths(Map<String, UnitAtom> atoms) {
    add(atoms, "[in_i]", 254, -4, Dimension.LENGTH);
    add(atoms, "[ft_i]", 3048, -4, Dimension.LENGTH);
    add(atoms, "[yd_i]", 9144, -4, Dimension.LENGTH);
    add(atoms, "[mi_i]", 1_609_344, -3, Dimension.LENGTH);
    add(atoms, "[mil_i]", 254, -7, Dimension.LENGTH);
    add(atoms, "[nmi_i]", 1852, 0, Dimension.LENGTH);
    add(atoms, "[kn_i]", new Magnitude(1852, 3600, 0), SystemUnits.SPEED);
    add(atoms, "[ft_us]", new Magnitude(1200, 3937, 0), Dimension.LENGTH);
    add(atoms, "[sin_i]", 64_516, -8, SystemUnits.AREA);
    add(atoms, "[sft_i]", 9_290_304, -8, SystemUnits.AREA);
    add(atoms, "[syd_i]", 83_612_736, -8, SystemUnits.AREA);
  }

  private static void addVolumes(Map<String, UnitAtom> atoms) {
    add(atoms, "[cin_i]", 16_387_064, -12, SystemUnits.VOLUME);
    add(atoms, "[cft_i]", 28_316_846_592.0, -12, SystemUnits.VOLUME);
    add(atoms, "[cyd_i]", 764_554_857_984.0, -12, SystemUnits.VOLUME);
    add(atoms, "[gal_us]", 3_785_411_784.0, -12, SystemUnits.VOLUME);
    add(atoms, "[qt_us]", 946_352_946, -12, SystemUnits.VOLUME);
    add(atoms, "[pt_us]", 473_176_473, -12, SystemUnits.VOLUME);
    add(atoms, "[foz_us]", new Magnitude(473_176_473, 16, -12), SystemUnits.VOLUME);
    add(atoms, "[bbl_us]", 158_987_294_928.0, -12, SystemUnits.VOLUME);
    add(atoms, "[gal_br]", 454_609, -8, SystemUnits.VOLUME);
    add(atoms, "[qt_br]", new Magnitude(454_609, 4, -8), SystemUnits.VOLUME);
    add(atoms, "[pt_br]", new Magnitude(454_609, 8, -8), SystemUnits.VOLUME);
  }

  private static void addMasses(Map<String, UnitAtom> atoms) {
    add(atoms, "[lb_av]", 45_359_237, -8, Dimension.MASS);
    add(atoms, "[oz_av]", new Magnitude(45_359_237, 16, -8), Dimension.MASS);
    add(atoms, "[gr]", 6_479_891, -11, Dimension.MASS);
    add(atoms, "[stone_av]", 635_029_318, -8, Dimension.MASS);
    add(atoms, "[scwt_av]", 45_359_237, -6, Dimension.MASS);
    add(atoms, "[lcwt_av]", 5_080_234_544.0, -8, Dimension.MASS);
    add(atoms, "[ston_av]", 90_718_474_000.0, -8, Dimension.MASS);
    add(atoms, "[lton_av]", 101_604_690_880.0, -8, Dimension.MASS);
  }

  private static void addForcesAndEnergies(Map<String, UnitAtom> atoms) {
    Magnitude poundForce = Magnitude.of(45_359_237.0 * 980_665.0, -13);
    Magnitude inch = Magnitude.of(254, -4);
    Magnitude foot = Magnitude.of(3048, -4);
    add(atoms, "[lbf_av]", poundForce, SystemUnits.FORCE);
    add(atoms, "[psi]", poundForce.times(inch.power(-2)), SystemUnits.PRESSURE);
    add(atoms, "[in_i'H2O]", inch.times(Magnitude.of(980_665, -2)), SystemUnits.PRESSURE);
    add(atoms, "[in_i'Hg]", inch.times(Magnitude.of(133_322, 0)), SystemUnits.PRESSURE);
    add(atoms, "[HP]", poundForce.times(foot).times(Magnitude.of(550, 0)), SystemUnits.POWER);
    add(atoms, "[Btu_IT]", 105_505_585_262.0, -8, SystemUnits.ENERGY);
    add(atoms, "[Btu_th]", 105_435, -2, SystemUnits.ENERGY);
    add(atoms, "[Btu]", 105_435, -2, SystemUnits.ENERGY);
  }

  private static void addTemperatures(Map<String, UnitAtom> atoms) {
    Magnitude rankine = new Magnitude(5, 9, 0);
    add(atoms, "[degR]", rankine, Dimension.TEMPERATURE);
    double offset = FAHRENHEIT_ZERO * 5 / 9;
    SystemUnits.plain(atoms, "[degF]", new UnitTerm(rankine, Dimension.TEMPERATURE, offset));
  }

  private static void add(
      Map<String, UnitAtom> atoms, String symbol, double size, int tens, Dimension dimension) {
    add(atoms, symbol, Magnitude.of(size, tens), dimension);
  }

  private static void add(
      Map<String, UnitAtom> atoms, String symbol, Magnitude size, Dimension dimension) {
    SystemUnits.plain(atoms, symbol, new UnitTerm(size, dimension, 0));
  }
}
