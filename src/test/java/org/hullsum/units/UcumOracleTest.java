package org.hullsum.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import java.util.Set;
import javax.measure.IncommensurableException;
import javax.measure.UnitConverter;
import javax.measure.format.UnitFormat;
import org.hullsum.problem.TextFault;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import systems.uom.ucum.format.UCUMFormat;

/**
 * Our units against an independent library of UCUM codes, systems-ucum: the library must be able to
 * convert the code to the SI unit of our dimension, with our size.
 */
class UcumOracleTest {
  /** Both multiply up to twenty rounded factors. */
  private static final double ROUNDING = 1e-13;

  private static final int COMBINATIONS = 3000;

  /**
   * Where the library differs, it is out of date or at fault: the electronvolt, the elementary
   * charge and the dalton are of CODATA 2006 there; its horsepower lacks the factor 550; it has no
   * degree Rankine. Nor has it powers of ten such as {@code 10*3}, which are tested by hand, or the
   * deciare.
   */
  private static final Set<String> NOT_COMPARED = Set.of("eV", "[e]", "u", "[HP]", "[degR]");

  private static final List<String> PREFIXES = List.of("k", "m", "M", "u", "c", "h", "n", "G");

  private static UnitConverter oracle(String code, Dimension dimension) {
    UnitFormat format = UCUMFormat.getInstance(UCUMFormat.Variant.CASE_SENSITIVE);
    try {
      return format.parse(code).getConverterToAny(format.parse(dimension.toString()));
    } catch (RuntimeException e) {
      throw new AssertionError(code + " is not read by the oracle", e);
    } catch (IncommensurableException e) {
      throw new AssertionError(code + " is not of dimension " + dimension, e);
    }
  }

  private static void compare(String code) throws TextFault {
    Unit ours = UnitParser.parse(code);
    UnitConverter oracle = oracle(code, ours.dimension());
    double size = ours.scale() + Math.abs(ours.offset());
    assertEquals(oracle.convert(1.0), ours.toSi(1), ROUNDING * size, code);
    assertEquals(oracle.convert(0.0), ours.toSi(0), ROUNDING * size, code);
  }

  private static List<UnitAtom> codesOfBoth() {
    return UnitTable.instance().atoms().stream()
        .takeWhile(atom -> !atom.symbol().equals("hr"))
        .filter(atom -> !NOT_COMPARED.contains(atom.symbol()))
        .toList();
  }

  @Test
  void everySymbolHasTheSizeAndDimensionOfTheOracle() throws TextFault {
    List<UnitAtom> atoms = codesOfBoth();
    assertTrue(atoms.size() > 90, "only " + atoms.size() + " symbols compared");
    for (UnitAtom atom : atoms) {
      compare(atom.symbol());
    }
  }

  @Test
  void everyPrefixOfEveryMetricSymbolHasTheSizeOfTheOracle() throws TextFault {
    List<String> prefixes =
        List.of(
            "Y", "Z", "E", "P", "T", "G", "M", "k", "h", "da", "d", "c", "m", "u", "n", "p", "f",
            "a", "z", "y");
    Set<String> readOtherwise = Set.of("ft", "dar");
    int compared = 0;
    for (UnitAtom atom : codesOfBoth()) {
      for (String prefix : prefixes) {
        String code = prefix + atom.symbol();
        if (atom.metric() && !readOtherwise.contains(code)) {
          compare(code);
          compared++;
        }
      }
    }
    assertTrue(compared > 800, "only " + compared + " compared");
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12})
  void randomCombinationHasTheSizeAndDimensionOfTheOracle(long seed) throws TextFault {
    Random random = new Random(seed);
    List<UnitAtom> atoms = codesOfBoth();
    for (int i = 0; i < COMBINATIONS; i++) {
      compare(product(random, atoms, 2));
    }
  }

  private static String product(Random random, List<UnitAtom> atoms, int depth) {
    StringBuilder code = new StringBuilder(random.nextInt(10) == 0 && depth == 2 ? "/" : "");
    int factors = 2 + random.nextInt(2);
    for (int i = 0; i < factors; i++) {
      String factor =
          depth > 0 && random.nextInt(4) == 0
              ? "(" + product(random, atoms, depth - 1) + ")"
              : factor(random, atoms);
      if (i > 0) {
        // A point between two digits would be a decimal point, which ours refuses.
        boolean point =
            Character.isDigit(code.charAt(code.length() - 1))
                && Character.isDigit(factor.charAt(0));
        code.append(!point && random.nextBoolean() ? '.' : '/');
      }
      code.append(factor);
    }
    return code.toString();
  }

  private static String factor(Random random, List<UnitAtom> atoms) {
    if (random.nextInt(12) == 0) {
      return "" + (1 + random.nextInt(60));
    }
    UnitAtom atom = atoms.get(random.nextInt(atoms.size()));
    while (atom.term().offset() != 0) {
      atom = atoms.get(random.nextInt(atoms.size()));
    }
    boolean prefixed = atom.metric() && random.nextInt(3) == 0;
    String prefix = prefixed ? PREFIXES.get(random.nextInt(PREFIXES.size())) : "";
    int exponent = random.nextInt(8) - 3;
    String power = exponent == 0 || exponent == 1 || exponent > 3 ? "" : "" + exponent;
    return prefix + atom.symbol() + power + (random.nextInt(10) == 0 ? "{x}" : "");
  }

  @Test
  void doubleSlashIsRefusedWhereTheOracleReadsAProduct() {
    assertThrows(TextFault.class, () -> UnitParser.parse("kg//s"));
    assertEquals(1.0, oracle("kg//s", Dimension.MASS.times(Dimension.TIME)).convert(1.0), "kg//s");
  }
}
