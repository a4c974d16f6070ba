package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import org.apache.commons.math3.analysis.integration.IterativeLegendreGaussIntegrator;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.model.Case;
import org.hullsum.model.FluxStatement;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Velocity profiles: the mean against an independent integral, and the shape at points. */
class ProfileLawTest {
  private static final double RADIUS = 0.2;

  private static final SurfaceEntry.Disk DISK =
      new SurfaceEntry.Disk(
          VectorExpression.of(new Vector3(1, 2, 3)), Expression.number(RADIUS), true);

  private static double value(Expression e, double distance) {
    BatchEvaluator evaluator =
        BatchEvaluator.compile(List.of("x", "y", "z"), Map.of("speed", 2.0), List.of(e));
    double[][] result = new double[1][1];
    double[][] at = {{1}, {2 + distance}, {3}};
    evaluator.evaluate(at, 1, result, evaluator.workspace());
    return result[0][0];
  }

  /**
   * The mean of the share over the disk, 2 ∫ share(R(1 − w⁷)) (1 − w⁷) 7 w⁶ dw, by a
   * general-purpose integrator; the seventh power takes the root at the wall away.
   */
  private static double mean(ProfileLaw law) {
    return new IterativeLegendreGaussIntegrator(20, 1e-13, 1e-13)
        .integrate(
            1_000_000,
            w -> {
              double fromWall = Math.pow(w, 7);
              double share = value(law.share(), RADIUS * (1 - fromWall));
              return 2 * share * (1 - fromWall) * 7 * Math.pow(w, 6);
            },
            0,
            1);
  }

  @ParameterizedTest
  @ValueSource(doubles = {1, 2, 6.6, 7, 10})
  void powerLawHasTheMeanOfItsShape(double n) {
    ProfileLaw law = ProfileLaw.power(DISK, Expression.number(n), "n");

    assertEquals(mean(law), value(law.meanShare(), 0), 1e-10);
  }

  @Test
  void powerLawOfSevenHasTheMeanOfTheHandbooks() {
    ProfileLaw law = ProfileLaw.power(DISK, Expression.number(7), "7");

    assertEquals(49.0 / 60, value(law.meanShare(), 0), 1e-15);
    assertEquals("power law, n = 7", law.text());
  }

  /** Mean over centreline speed as fluid mechanics texts print it; from memory, 0.817 seen. */
  @ParameterizedTest
  @CsvSource({
    "5, 0.758, 0.757576",
    "6, 0.791, 0.791209",
    "7, 0.817, 0.816667",
    "8, 0.837, 0.836601",
    "9, 0.853, 0.852632",
    "10, 0.866, 0.865801"
  })
  void powerLawsHaveThePrintedRatios(double n, double printed, double computed) {
    ProfileLaw law = ProfileLaw.power(DISK, Expression.number(n), "n");

    assertEquals(printed, value(law.meanShare(), 0), 0.0005);
    assertEquals(computed, value(law.meanShare(), 0), 5e-7);
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-5, 3e-4, 0.01, 0.2})
  void logLawHasTheMeanOfItsShape(double roughness) {
    ProfileLaw law = ProfileLaw.logarithmic(DISK, Expression.number(roughness), "E");

    assertEquals(mean(law), value(law.meanShare(), 0), 1e-10);
  }

  @Test
  void laminarAndUniformHaveTheMeansOfTheirShapes() {
    assertEquals(0.5, mean(ProfileLaw.laminar(DISK)), 1e-13);
    assertEquals(1, mean(ProfileLaw.uniform()), 1e-13);
  }

  @Test
  void everyLawIsOneAtTheCentreAndVanishesAtTheWall() {
    List<ProfileLaw> laws =
        List.of(
            ProfileLaw.power(DISK, Expression.number(7), "7"),
            ProfileLaw.laminar(DISK),
            ProfileLaw.logarithmic(DISK, Expression.number(1e-3), "1 mm"));
    for (ProfileLaw law : laws) {
      assertEquals(1, value(law.share(), 0), 1e-14, law.text());
      assertTrue(value(law.share(), RADIUS * (1 - 1e-12)) < 0.03, law.text());
      assertTrue(Double.isFinite(value(law.share(), RADIUS * (1 + 1e-15))), law.text());
    }
  }

  @ParameterizedTest
  @CsvSource({
    "'power-law: 7, centreline: speed', 2.0",
    "'power-law: 7, mean: speed', 2.4489795918367347",
    "'laminar: , mean: speed', 4.0",
    "'laminar: true, centreline: speed', 2.0",
    "'uniform: , mean: speed', 2.0"
  })
  void profileOfACaseHasTheStatedSpeed(String profile, double atTheCentre) {
    Case found =
        CaseTexts.good(
            CaseTexts.completed(
                """
                parameters: {speed: 2.0 m/s}
                patches:
                  p:
                    surface:
                      disk: {centre: [0, 1, 0], normal: [1, 0, 0], radius: 0.2}
                      placed: {move: [1, 1, 3]}
                    flux: {profile: {PROFILE}}
                """
                    .replace("PROFILE", profile)));
    FluxStatement statement = found.patches().get(0).fluxes().get(0).statement();

    assertEquals(atTheCentre, value(((FluxStatement.Profile) statement).density(), 0), 1e-14);
  }
}
