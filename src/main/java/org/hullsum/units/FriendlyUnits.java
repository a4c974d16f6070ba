package org.hullsum.units;

import java.util.Map;
import java.util.Optional;

/**
 * Spellings that people write and UCUM does not know, each standing for a UCUM symbol or a size of
 * its own. Those with more than one meaning carry a note on the one that was taken; those too
 * ambiguous to take are not here but in {@link UnitAdvice}. Must come after the UCUM symbols.
 */
final class FriendlyUnits {
  /** Spelling, then the UCUM symbol that it stands for. */
  private static final String[][] SAME = {
    {"hr", "h"},
    {"hour", "h"},
    {"day", "d"},
    {"sec", "s"},
    {"yr", "a"},
    {"year", "a"},
    {"week", "wk"},
    {"degC", "Cel"},
    {"°C", "Cel"},
    {"ºC", "Cel"},
    {"℃", "Cel"},
    {"degF", "[degF]"},
    {"°F", "[degF]"},
    {"ºF", "[degF]"},
    {"℉", "[degF]"},
    {"degR", "[degR]"},
    {"°", "deg"},
    {"º", "deg"},
    {"ppm", "[ppm]"},
    {"ppb", "[ppb]"},
    {"‰", "[ppth]"},
    {"in", "[in_i]"},
    {"ft", "[ft_i]"},
    {"yd", "[yd_i]"},
    {"mi", "[mi_i]"},
    {"lb", "[lb_av]"},
    {"oz", "[oz_av]"},
    {"lbf", "[lbf_av]"},
    {"psi", "[psi]"},
    {"inHg", "[in_i'Hg]"},
    {"inH2O", "[in_i'H2O]"},
    {"kn", "[kn_i]"}
  };

  /** As {@link #SAME}, for symbols that take a metric prefix. */
  private static final String[][] SAME_METRIC = {
    {"ohm", "Ohm"}, {"\u03a9", "Ohm"}, {"\u2126", "Ohm"}, {"mHg", "m[Hg]"}, {"mH2O", "m[H2O]"}
  };

  private static final String US = " as US gallons (3.785411784 L); the British ones are [gal_br]";
  private static final String ANGULAR =
      " as an angular speed, one turn being 2 pi rad; for a count write 1/min";

  private FriendlyUnits() {}

  static void addTo(Map<String, UnitAtom> atoms) {
    for (String[] pair : SAME) {
      SystemUnits.plain(atoms, pair[0], atoms.get(pair[1]).term());
    }
    for (String[] pair : SAME_METRIC) {
      UnitTerm term = atoms.get(pair[1]).term();
      atoms.put(pair[0], new UnitAtom(pair[0], term, true, Optional.empty()));
    }
    UnitTerm minute = atoms.get("min").term();
    UnitTerm hour = atoms.get("h").term();
    SystemUnits.metric(atoms, "Wh", 3600, 0, SystemUnits.ENERGY);
    SystemUnits.metric(atoms, "Ah", 3600, 0, Dimension.CURRENT.times(Dimension.TIME));
    SystemUnits.plain(atoms, "ha", UnitTerm.of(1, 4, SystemUnits.AREA));
    SystemUnits.plain(atoms, "lbmol", UnitTerm.of(45_359_237, -5, Dimension.AMOUNT));
    SystemUnits.plain(atoms, "mph", atoms.get("[mi_i]").term().over(hour));
    SystemUnits.plain(atoms, "cfm", atoms.get("[cft_i]").term().over(minute));
    SystemUnits.plain(atoms, "cfs", atoms.get("[cft_i]").term().over(atoms.get("s").term()));
    UnitTerm torr = new UnitTerm(new Magnitude(101_325, 760, 0), SystemUnits.PRESSURE, 0);
    SystemUnits.plain(atoms, "Torr", torr);
    addNoted(atoms, minute, hour);
  }

  private static void addNoted(Map<String, UnitAtom> atoms, UnitTerm minute, UnitTerm hour) {
    UnitTerm gallon = atoms.get("[gal_us]").term();
    note(atoms, "gal", gallon, "'gal' was read" + US);
    note(atoms, "gpm", gallon.over(minute), "'gpm' was read per minute" + US);
    note(atoms, "gph", gallon.over(hour), "'gph' was read per hour" + US);
    UnitTerm barrel = atoms.get("[bbl_us]").term();
    note(atoms, "bbl", barrel, "'bbl' was read as barrels of 42 US gallons, [bbl_us]");
    UnitTerm heat = atoms.get("[Btu_IT]").term();
    note(atoms, "Btu", heat, "'Btu' was read as the International Table Btu, [Btu_IT]");
    note(atoms, "BTU", heat, "'BTU' was read as the International Table Btu, [Btu_IT]");
    UnitTerm horse = atoms.get("[HP]").term();
    note(atoms, "hp", horse, "'hp' was read as the mechanical horsepower of 550 ft.lbf/s, [HP]");
    UnitTerm turn = atoms.get("circ").term();
    note(atoms, "rpm", turn.over(minute), "'rpm' was read" + ANGULAR);
    note(atoms, "rev", turn, "'rev' was read as a turn of 2 pi rad; for a count write 1");
  }

  private static void note(Map<String, UnitAtom> atoms, String symbol, UnitTerm term, String note) {
    atoms.put(symbol, new UnitAtom(symbol, term, false, Optional.of(note)));
  }
}
