package org.hullsum.units;

import java.util.Map;

/** What to write instead of the commonest spellings that are no units. */
final class UnitHints {
  private static final String NORMAL_VOLUME =
      "a normal or standard volume depends on a reference state; give the flow in kg/h or kmol/h,"
          + " or the volume at its own state in m3/h";
  private static final String GAUGE =
      "gauge and absolute pressures are not told apart by the unit; write the plain unit, and add"
          + " the atmosphere where an absolute pressure is meant";
  private static final String LOGARITHMIC = "logarithmic units are not read; write the plain ratio";
  private static final String TON =
      "'ton' has several sizes: write t (1000 kg), [ston_av] (2000 lb) or [lton_av] (2240 lb)";
  private static final String PARTS =
      "'ppt' has two meanings: write [ppth] (10*-3) or [pptr] (10*-12)";
  private static final String FEET =
      "write deg for an angle, ft or in for a length, min or s for a time";

  /** By the symbol in lower case. */
  static final Map<String, String> BY_SYMBOL =
      Map.ofEntries(
          Map.entry("ton", TON),
          Map.entry("tons", TON),
          Map.entry("ppt", PARTS),
          Map.entry("tonne", "write t"),
          Map.entry("tonnes", "write t"),
          Map.entry("tph", "write t/h"),
          Map.entry("tpd", "write t/d"),
          Map.entry("lpm", "write L/min"),
          Map.entry("lpd", "write L/d"),
          Map.entry("lps", "write L/s"),
          Map.entry("lph", "write L/h"),
          Map.entry("mps", "write m/s"),
          Map.entry("kph", "write km/h"),
          Map.entry("kmh", "write km/h"),
          Map.entry("mgd", "write 10*6.[gal_us]/d"),
          Map.entry("pas", "write Pa.s"),
          Map.entry("nm", "write N.m for a torque; " + NORMAL_VOLUME),
          Map.entry("cc", "write cm3"),
          Map.entry("ccm", "write cm3"),
          Map.entry("cbm", "write m3"),
          Map.entry("sqm", "write m2"),
          Map.entry("sqft", "write ft2"),
          Map.entry("cuft", "write ft3"),
          Map.entry("micron", "write um"),
          Map.entry("hrs", "write h"),
          Map.entry("hours", "write h"),
          Map.entry("minute", "write min"),
          Map.entry("minutes", "write min"),
          Map.entry("mins", "write min"),
          Map.entry("second", "write s"),
          Map.entry("seconds", "write s"),
          Map.entry("secs", "write s"),
          Map.entry("days", "write d"),
          Map.entry("years", "write a"),
          Map.entry("months", "write mo"),
          Map.entry("litre", "write L"),
          Map.entry("litres", "write L"),
          Map.entry("liter", "write L"),
          Map.entry("liters", "write L"),
          Map.entry("metre", "write m"),
          Map.entry("metres", "write m"),
          Map.entry("meter", "write m"),
          Map.entry("meters", "write m"),
          Map.entry("gram", "write g"),
          Map.entry("grams", "write g"),
          Map.entry("kgs", "write kg"),
          Map.entry("lbs", "write lb"),
          Map.entry("inch", "write in"),
          Map.entry("inches", "write in"),
          Map.entry("foot", "write ft"),
          Map.entry("feet", "write ft"),
          Map.entry("gallon", "write [gal_us] or [gal_br]"),
          Map.entry("gallons", "write [gal_us] or [gal_br]"),
          Map.entry("kelvin", "write K"),
          Map.entry("degk", "write K"),
          Map.entry("celsius", "write degC"),
          Map.entry("fahrenheit", "write degF"),
          Map.entry("degree", "write deg for an angle, degC for a temperature"),
          Map.entry("degrees", "write deg for an angle, degC for a temperature"),
          Map.entry("percent", "write %"),
          Map.entry("pct", "write %"),
          Map.entry("mole", "write mol"),
          Map.entry("moles", "write mol"),
          Map.entry("kgmol", "write kmol"),
          Map.entry("bara", GAUGE),
          Map.entry("barg", GAUGE),
          Map.entry("psia", GAUGE),
          Map.entry("psig", GAUGE),
          Map.entry("sm", NORMAL_VOLUME),
          Map.entry("ncm", NORMAL_VOLUME),
          Map.entry("scf", NORMAL_VOLUME),
          Map.entry("scfm", NORMAL_VOLUME),
          Map.entry("scfh", NORMAL_VOLUME),
          Map.entry("mmscf", NORMAL_VOLUME),
          Map.entry("mmbtu", "write 10*6.[Btu_IT]"),
          Map.entry("db", LOGARITHMIC),
          Map.entry("[ph]", LOGARITHMIC),
          Map.entry("'", FEET),
          Map.entry("\"", FEET),
          Map.entry("''", FEET));

  private UnitHints() {}
}
