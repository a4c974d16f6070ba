package org.hullsum.units;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.hullsum.problem.InternalFault;
import org.hullsum.problem.TextFault;

/**
 * Units that the trade takes for one another: written where another was meant, or set in an
 * instrument that is read in another. Common practice, no source.
 */
public final class ConfusableUnits {
  /** Units of one line are taken for one another. */
  private static final List<List<String>> GROUPS =
      List.of(
          List.of("l/min", "m3/h", "l/s", "l/h"),
          List.of("m3/h", "m3/min", "m3/s", "m3/d"),
          List.of("[gal_us]/min", "[gal_br]/min"),
          List.of("[gal_us]/min", "l/min", "m3/h"),
          List.of("[gal_us]/min", "[gal_us]/h"),
          List.of("[gal_br]/min", "l/min", "m3/h"),
          List.of("[gal_us]/d", "[gal_br]/d", "m3/d"),
          List.of("[cft_i]/min", "m3/h", "l/s"),
          List.of("ml/min", "l/h"),
          List.of("t/h", "[ston_av]/h", "[lton_av]/h", "kg/s"),
          List.of("t/d", "[ston_av]/d", "[lton_av]/d", "t/h"),
          List.of("kg/h", "[lb_av]/h", "kg/min", "kg/s"),
          List.of("kg/h", "t/d", "g/s"),
          List.of("kW", "[Btu]/h", "kcal/h", "MW", "kJ/h"),
          List.of("%", "1", "ppm"),
          List.of("g/l", "mg/l"),
          List.of("g/kg", "mg/kg", "%"));

  /** Norm cubic metres, of 0 °C, where actual ones of 20 °C or 15 °C are meant, and the reverse. */
  private static final Map<String, Double> NORM =
      new TreeMap<>(
          Map.of(
              "actual m3 of 20 degC", 293.15 / 273.15,
              "actual m3 of 15 degC", 288.15 / 273.15,
              "norm m3, being actual of 20 degC", 273.15 / 293.15,
              "norm m3, being actual of 15 degC", 273.15 / 288.15));

  private ConfusableUnits() {}

  /**
   * A unit that may have been meant.
   *
   * @param meant how it is written
   * @param factor by which a figure grows that is read in it
   */
  public record Confusion(String meant, double factor) {}

  /**
   * What a stated unit may have been taken for, each factor once.
   *
   * @param stated a unit with a figure
   */
  public static List<Confusion> of(Unit stated) {
    List<Confusion> found = new ArrayList<>();
    for (List<String> group : GROUPS) {
      List<Unit> units = group.stream().map(ConfusableUnits::parsed).toList();
      if (units.stream().anyMatch(u -> u.sameScale(stated))) {
        for (Unit unit : units) {
          add(new Confusion(unit.code(), unit.scale() / stated.scale()), found);
        }
      }
    }
    return List.copyOf(found);
  }

  /** What a cubic metre of a gas may have been taken for. */
  public static List<Confusion> ofGasVolumes() {
    return NORM.entrySet().stream().map(e -> new Confusion(e.getKey(), e.getValue())).toList();
  }

  private static void add(Confusion confusion, List<Confusion> found) {
    boolean known =
        Math.abs(confusion.factor() - 1) < SAME
            || found.stream().anyMatch(c -> Math.abs(c.factor() / confusion.factor() - 1) < SAME);
    if (!known) {
      found.add(confusion);
    }
  }

  /** Factors nearer than this are one. */
  private static final double SAME = 1e-9;

  private static Unit parsed(String code) {
    try {
      return UnitParser.parse(code);
    } catch (TextFault fault) {
      throw new InternalFault("the unit " + code + " is known: " + fault.getMessage());
    }
  }
}
