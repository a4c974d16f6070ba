package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** One good case, and siblings broken in one named way each. */
class OneFaultTest {
  /** Marks in a replacement where the problem must be told. */
  static final String MARK = "¤";

  /** A way to break the good case: a text in it and what stands in its place. */
  record Fault(String name, String found, String replacement, ProblemKind kind, String said) {
    @Override
    public String toString() {
      return name;
    }
  }

  private static Fault fault(
      String name, String found, String replacement, ProblemKind kind, String said) {
    return new Fault(name, found, replacement, kind, said);
  }

  static List<Fault> structure() {
    return List.of(
        fault(
            "unknown key",
            "    leaves: basin\n    surface: {disk: {centre: [0, 0, 0]",
            "    ¤leafs: basin\n    leaves: basin\n    surface: {disk: {centre: [0, 0, 0]",
            ProblemKind.UNKNOWN_KEY,
            "did you mean `leaves`"),
        fault(
            "misspelt required key",
            "flux: {field: flow}\n  wall",
            "¤flx: {field: flow}\n  wall",
            ProblemKind.UNKNOWN_KEY,
            "did you mean `flux`"),
        fault(
            "key of another place",
            "    label: Settling basin\n",
            "    ¤facing: upward\n",
            ProblemKind.UNKNOWN_KEY,
            "it belongs in a patch"),
        fault(
            "glued key in a flow",
            "{field: flow}\n  wall",
            "{¤field:flow}\n  wall",
            ProblemKind.UNKNOWN_KEY,
            "a blank is missing after `field:`"),
        fault(
            "duplicate key",
            "title: Settling",
            "title: T\n¤title: Settling",
            ProblemKind.DUPLICATE_KEY,
            "twice"),
        fault(
            "duplicate patch",
            "  wall:\n",
            "  ¤bed:\n",
            ProblemKind.DUPLICATE_KEY,
            "first on line"),
        fault(
            "merge key",
            "    unit: m/s\n  turning",
            "    ¤<<: {}\n    unit: m/s\n  turning",
            ProblemKind.MERGE_KEY,
            "merge keys"),
        fault(
            "missing format", "format: hullsum-case/1\n", "¤", ProblemKind.MISSING_KEY, "`format`"),
        fault(
            "other format",
            "hullsum-case/1",
            "¤hullsum-case/2",
            ProblemKind.WRONG_VALUE,
            "hullsum-case/1"),
        fault(
            "missing flux",
            "    flux: {field: flow}\n  wall",
            "  wall",
            ProblemKind.MISSING_KEY,
            "`flux`"),
        fault(
            "key without value",
            "label: Settling basin",
            "¤label:",
            ProblemKind.MISSING_KEY,
            "has no value"),
        fault(
            "missing radius",
            "normal: [0, 0, -1], radius: radius",
            "normal: [0, 0, -1]",
            ProblemKind.MISSING_KEY,
            "`radius`"),
        fault(
            "missing unit",
            "    unit: m/s\n  turning",
            "  turning",
            ProblemKind.MISSING_KEY,
            "`unit`"),
        fault(
            "text for a mapping",
            "surface: {disk: {centre: [9, 0, 0], normal: [1, 0, 0], radius: 50 mm}}",
            "surface: ¤disk",
            ProblemKind.WRONG_TYPE,
            "here is the text `disk`"),
        fault(
            "list for a text",
            "title: Settling basin, summer operating point",
            "title: ¤[a, b]",
            ProblemKind.WRONG_TYPE,
            "a list of 2 items"),
        fault(
            "mapping for a list",
            "normal: [0, 0, -1]",
            "normal: ¤{z: -1}",
            ProblemKind.WRONG_TYPE,
            "a mapping"),
        fault(
            "two components",
            "normal: [0, 0, -1]",
            "normal: ¤[0, -1]",
            ProblemKind.WRONG_TYPE,
            "of three components"),
        fault(
            "comma cuts an item",
            "normal: [0, 0, -1]",
            "normal: ¤[max(0, 1), 0, 1]",
            ProblemKind.WRONG_TYPE,
            "in quotes"),
        fault(
            "two kinds of surface",
            "surface: {disk: {centre: [9",
            "surface: {¤sphere: {centre: [0, 0, 0], radius: 1}, disk: {centre: [9",
            ProblemKind.WRONG_VALUE,
            "disk and sphere"),
        fault(
            "table",
            "{metered: 9.5 m3/h ± 1 %, within: [0 m3/h, 60 m3/h]}",
            "{metered: {¤file: a.csv}}",
            ProblemKind.NOT_SUPPORTED,
            "not supported yet"),
        fault(
            "totaliser",
            "{metered: 9.5 m3/h ± 1 %, within: [0 m3/h, 60 m3/h]}",
            "{metered: {¤totaliser: [1 m3, 2 m3]}}",
            ProblemKind.NOT_SUPPORTED,
            "not supported yet"),
        fault(
            "facet values",
            "{profile: {power-law: 7, mean: 2.0 m/s}}",
            "{¤facet-values: {array: U}}",
            ProblemKind.NOT_SUPPORTED,
            "not supported yet"),
        fault(
            "level",
            "{generation: 0 m3/h ± 0.1 m3/h}",
            "{accumulation: {¤level: {from: 1 m}}}",
            ProblemKind.NOT_SUPPORTED,
            "not supported yet"),
        fault(
            "holdup",
            "{generation: 0 m3/h ± 0.1 m3/h}",
            "{accumulation: {¤holdup: {from: 1 m3}}}",
            ProblemKind.NOT_SUPPORTED,
            "not supported yet"),
        fault(
            "quantities",
            "quantity: volume",
            "¤quantities: {water: {unit: t/h}}",
            ProblemKind.NOT_SUPPORTED,
            "not supported yet"),
        fault(
            "network",
            "quantity: volume",
            "quantity: volume\n¤network: {flows: a.csv}",
            ProblemKind.NOT_SUPPORTED,
            "not supported yet"),
        fault(
            "carried-by",
            "{profile: {power-law: 7, mean: 2.0 m/s}}",
            "{¤carried-by: water}",
            ProblemKind.NOT_SUPPORTED,
            "not supported yet"));
  }

  static List<Fault> names() {
    return List.of(
        fault(
            "unknown volume",
            "leaves: basin\n    surface:\n",
            "leaves: ¤bassin\n    surface:\n",
            ProblemKind.UNKNOWN_NAME,
            "did you mean `basin`"),
        fault(
            "unknown field",
            "{field: flow}\n  wall",
            "{field: ¤flw}\n  wall",
            ProblemKind.UNKNOWN_NAME,
            "did you mean `flow`"),
        fault(
            "unknown parameter",
            "depth: 0.8*radius",
            "depth: 0.8*¤radus",
            ProblemKind.UNKNOWN_NAME,
            "did you mean 'radius'"),
        fault(
            "unknown function",
            "\"swirl*r\"",
            "\"swirl*¤sqr(r)\"",
            ProblemKind.UNKNOWN_NAME,
            "sqr"),
        fault(
            "field of a sum",
            "sum: [rising, turning]",
            "sum: [rising, ¤turnig]",
            ProblemKind.UNKNOWN_NAME,
            "did you mean `turning`"),
        fault(
            "field made of itself",
            "sum: [rising, turning]",
            "sum: [rising, ¤flow]",
            ProblemKind.CYCLE,
            "flow → flow"),
        fault(
            "unknown volume of an envelope",
            "of: [basin, sump]",
            "of: [basin, ¤sumpf]",
            ProblemKind.UNKNOWN_NAME,
            "did you mean `sump`"),
        fault(
            "volume twice in an envelope",
            "of: [basin, sump]",
            "of: [basin, ¤basin]",
            ProblemKind.WRONG_VALUE,
            "twice"),
        fault(
            "envelope named as a volume",
            "  plant: {of",
            "  ¤basin: {of",
            ProblemKind.BAD_NAME,
            "a volume is called so"),
        fault(
            "correlated with nothing",
            "{drain: 0.4}",
            "{¤drane: 0.4}",
            ProblemKind.UNKNOWN_NAME,
            "did you mean `drain`"),
        fault(
            "waiver of no finding",
            "finding: flux-unknown",
            "finding: ¤flux-unknwon",
            ProblemKind.WRONG_VALUE,
            "did you mean `flux-unknown`"),
        fault(
            "waiver of a verdict",
            "finding: flux-unknown",
            "finding: ¤imbalanced",
            ProblemKind.WRONG_VALUE,
            "a verdict can't be waived"),
        fault(
            "waiver on nothing",
            "where: drain",
            "where: ¤dran",
            ProblemKind.UNKNOWN_NAME,
            "did you mean `drain`"),
        fault(
            "parameter named as a coordinate",
            "  swirl: 0.05 1/s",
            "  swirl: 0.05 1/s\n  ¤theta: 1",
            ProblemKind.BAD_NAME,
            "coordinate"),
        fault(
            "parameter named as a function",
            "  swirl: 0.05 1/s",
            "  swirl: 0.05 1/s\n  ¤max: 1",
            ProblemKind.BAD_NAME,
            "function"),
        fault(
            "patch without a letter",
            "  pipe:\n",
            "  ¤10:\n",
            ProblemKind.BAD_NAME,
            "at least one letter"),
        fault(
            "volume named surroundings",
            "  sump:\n    interior",
            "  ¤surroundings: {}\n  sump:\n    interior",
            ProblemKind.BAD_NAME,
            "the outside"),
        fault(
            "outside on both sides",
            "    leaves: sump\n    surface",
            "    leaves: ¤surroundings\n    surface",
            ProblemKind.WRONG_VALUE,
            "the surroundings"),
        fault(
            "neither side",
            "  ¤pipe:\n    leaves: sump\n".replace("¤", ""),
            "  ¤pipe:\n",
            ProblemKind.MISSING_KEY,
            "`leaves` or `enters`"),
        fault(
            "cycle of parameters",
            "radius: 4.0 m",
            "¤radius: depth/0.8",
            ProblemKind.CYCLE,
            "radius → depth → radius"));
  }

  static List<Fault> values() {
    return List.of(
        fault("unknown unit", "radius: 4.0 m\n", "radius: 4.0 ¤mtr\n", ProblemKind.UNIT, "mtr"),
        fault(
            "parenthesis not closed",
            "x^2 - y^2)\"]",
            "x^2 - y^2\"]",
            ProblemKind.EXPRESSION,
            "not closed"),
        fault(
            "product without a sign",
            "depth: 0.8*radius",
            "depth: ¤0.8radius",
            ProblemKind.EXPRESSION,
            "radius"),
        fault(
            "no meaning of an uncertainty",
            "uncertainties: k=2",
            "uncertainties: ¤k2",
            ProblemKind.UNCERTAINTY,
            "k=2"),
        fault(
            "wrong plus-minus", "0.5 m3/s ± 2 %", "0.5 m3/s ¤+- 2 %", ProblemKind.UNCERTAINTY, "±"),
        fault(
            "no finite number",
            "depth: 0.8*radius",
            "depth: ¤radius/0",
            ProblemKind.WRONG_VALUE,
            "not a finite number"),
        fault(
            "meter that is not finite",
            "metered: intake - 3 m3/h",
            "metered: ¤intake/0",
            ProblemKind.WRONG_VALUE,
            "not a finite number"),
        fault("radius of zero", "radius: 50 mm", "radius: ¤0", ProblemKind.WRONG_VALUE, "radius"),
        fault(
            "direction of no length",
            "normal: [1, 0, 0], radius: 50",
            "normal: ¤[0, 0, 0], radius: 50",
            ProblemKind.WRONG_VALUE,
            "zero"),
        fault(
            "unknown facing",
            "facing: downward",
            "facing: ¤downwards",
            ProblemKind.WRONG_VALUE,
            "did you mean `downward`"),
        fault(
            "unknown quantity",
            "quantity: volume",
            "quantity: ¤volum",
            ProblemKind.WRONG_VALUE,
            "did you mean `volume`"),
        fault(
            "unknown word of a flux",
            "{field: flow}\n  wall",
            "¤unknwon\n  wall",
            ProblemKind.WRONG_VALUE,
            "did you mean `unknown`"),
        fault(
            "profile over a cylinder",
            "disk: {centre: [9, 0, 0], normal: [1, 0, 0], radius: 50 mm}}\n    flux: {profile: {",
            "cylinder: {from: [9, 0, 0], to: [10, 0, 0], radius: 50 mm}}\n    flux: {profile: ¤{",
            ProblemKind.WRONG_VALUE,
            "a disk"),
        fault(
            "bounds upside down",
            "within: [0 m3/h, 60 m3/h]",
            "within: ¤[60 m3/h, 0 m3/h]",
            ProblemKind.WRONG_VALUE,
            "lower bound first"),
        fault(
            "correlation beyond one",
            "{drain: 0.4}",
            "{drain: ¤1.4}",
            ProblemKind.WRONG_VALUE,
            "between -1 and 1"),
        fault(
            "correlation with itself",
            "{drain: 0.4}",
            "{¤feed: 0.4}",
            ProblemKind.WRONG_VALUE,
            "itself"),
        fault(
            "negative tolerance",
            "relative: 0.01 %",
            "relative: ¤-0.01 %",
            ProblemKind.WRONG_VALUE,
            "not negative"),
        fault(
            "coverage beyond one",
            "relative: 0.01 %",
            "coverage: ¤950 %",
            ProblemKind.WRONG_VALUE,
            "between 0 and 1"),
        fault(
            "no whole number of steps",
            "steps: 10",
            "steps: ¤2.5",
            ProblemKind.WRONG_VALUE,
            "whole number"),
        fault("time backwards", "to: 60 s", "to: ¤-60 s", ProblemKind.WRONG_VALUE, "after `from`"),
        fault(
            "no date",
            "until: 2031-12-31",
            "until: ¤31.12.2031",
            ProblemKind.WRONG_VALUE,
            "2027-03-31"),
        fault(
            "divergence beside a source",
            "{divergence-of: flow}",
            "{¤divergence-of: flow, generation: 0 m3/h}",
            ProblemKind.WRONG_VALUE,
            "stands alone"),
        fault(
            "field without a surface",
            "{metered: intake - 3 m3/h}",
            "{¤field: flow}",
            ProblemKind.MISSING_KEY,
            "`surface`"),
        fault(
            "fixed without a meter",
            "{field: flow}\n  wall",
            "{field: flow, ¤fixed: true}\n  wall",
            ProblemKind.WRONG_VALUE,
            "`metered`"),
        fault(
            "sine of nothing",
            "\"swirl*r\"",
            "\"swirl*¤sin()\"",
            ProblemKind.EXPRESSION,
            "sin takes 1 argument"));
  }

  static List<Fault> dimensions() {
    return List.of(
        fault(
            "radius in seconds",
            "radius: 50 mm",
            "radius: ¤50 s",
            ProblemKind.DIMENSION,
            "`radius` must be in m"),
        fault(
            "sum of unlike terms",
            "lift*(radius^2 - x^2 - y^2)\"]",
            "lift*(radius - ¤x^2 - y^2)\"]",
            ProblemKind.DIMENSION,
            "m2"),
        fault(
            "sine of a length", "\"swirl*r\"", "\"swirl*r*sin(¤r)\"", ProblemKind.DIMENSION, "sin"),
        fault(
            "field not in its unit",
            "\"swirl*r\"",
            "\"¤swirl*r^2\"",
            ProblemKind.DIMENSION,
            "`m/s`"),
        fault(
            "density not in its unit",
            "\"lift*(radius^2 - x^2 - y^2)\", unit",
            "\"¤lift*radius\", unit",
            ProblemKind.DIMENSION,
            "`m/s`"),
        fault(
            "unit of another quantity",
            "y^2)\", unit: m/s}",
            "y^2)\", unit: ¤kg/(m2.s)}",
            ProblemKind.DIMENSION,
            "flux density of the quantity `volume`"),
        fault(
            "meter of another quantity",
            "metered: 12.5 m3/h ± 1.5 %",
            "metered: ¤12.5 kg/h ± 1.5 %",
            ProblemKind.DIMENSION,
            "m3.s-1"),
        fault(
            "claim of another quantity",
            "claim: 0.5 m3/s ± 2 %",
            "claim: ¤0.5 m2/s ± 2 %",
            ProblemKind.DIMENSION,
            "m3.s-1"),
        fault(
            "factor that does not fit",
            "{field: flow}\n  wall",
            "{field: ¤flow, times: 998 kg/m3}\n  wall",
            ProblemKind.DIMENSION,
            "with this `times`"),
        fault(
            "speed that is none",
            "mean: 2.0 m/s",
            "mean: ¤2.0 m3/s",
            ProblemKind.DIMENSION,
            "the speed"),
        fault(
            "tolerance of another quantity",
            "absolute: 1 L/s",
            "absolute: ¤1 kg/s",
            ProblemKind.DIMENSION,
            "`absolute`"),
        fault("instant in metres", "to: 60 s", "to: ¤60 m", ProblemKind.DIMENSION, "`time`"),
        fault(
            "angle in metres",
            "normal: [1, 0, 0], radius: 50 mm",
            "normal: [1, 0, 0], radius: 50 mm, sector: [0, ¤1 m]",
            ProblemKind.DIMENSION,
            "an angle"),
        fault(
            "uncertainty of another kind",
            "41.8 m3/h ± 0.6 m3/h",
            "41.8 m3/h ± ¤0.6 kg/h",
            ProblemKind.DIMENSION,
            "kg"));
  }

  @Test
  void goodCaseIsReadWithoutAnyWarning() {
    assertEquals(List.of(), CaseTexts.good(CaseTexts.goodCase()).warnings());
  }

  @ParameterizedTest
  @MethodSource({"structure", "names", "values", "dimensions"})
  void oneFaultIsOneProblemAtItsPlace(Fault fault) {
    String good = CaseTexts.goodCase();
    int at = good.indexOf(fault.found());
    assertTrue(at >= 0, "the good case does not hold: " + fault.found());
    String broken =
        good.substring(0, at) + fault.replacement() + good.substring(at + fault.found().length());
    int mark = broken.indexOf(MARK);
    String text = broken.replace(MARK, "");

    ReadOutcome outcome = CaseTexts.read(text);

    assertEquals(1, outcome.problems().size(), () -> CaseTexts.problems(outcome));
    Problem problem = outcome.problems().get(0);
    assertEquals(fault.kind(), problem.kind(), problem::toString);
    assertTrue(problem.message().contains(fault.said()), problem::toString);
    if (mark >= 0) {
      Place expected = new SourceText(CaseTexts.NAME, text).place(mark);
      assertEquals(expected, problem.place(), problem::toString);
    }
  }

  @Test
  void fiveMistakesAreFiveProblemsInTheOrderOfTheFile() {
    String text =
        CaseTexts.goodCase()
            .replace("radius: 4.0 m\n", "radius: 4.0 mtr\n")
            .replace("sum: [rising, turning]", "sum: [rising, turnig]")
            .replace("facing: downward", "facing: sideways")
            .replace("12.5 m3/h ± 1.5 %", "12.5 m3/h ± 1.5 % (k=0)")
            .replace("steps: 10", "step: 10");

    ReadOutcome outcome = CaseTexts.read(text);

    assertEquals(
        List.of(8, 23, 36, 53, 69),
        outcome.problems().stream().map(p -> p.place().line()).toList(),
        () -> CaseTexts.problems(outcome));
    assertTrue(outcome.found().isEmpty());
  }
}
