package org.hullsum.quadrature;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Integrals with known answers: the true error must lie within the bound, whatever happens. */
class BatteryTest {
  /** The last digits of the known answers themselves, relative to ∬|f|. */
  private static final double ANSWER_DIGITS = 1e-15;

  private static final int FEWEST = 60;
  private static final double TIGHT = 10;

  private static List<BatteryCase> battery() {
    List<BatteryCase> all = new ArrayList<>(SurfaceFields.cases());
    all.addAll(ExactIntegrals.cases());
    return all;
  }

  private record Outcome(BatteryCase one, Integral found, double error) {
    static Outcome of(BatteryCase one, double request) {
      Integral found = SquareIntegrator.integrate(one.problem(Accuracy.relative(request)))[0];
      double error = Math.abs(found.value() - one.exact());
      return new Outcome(one, found, Math.max(0, error - ANSWER_DIGITS * found.magnitude()));
    }

    String line() {
      return String.format(
          Locale.ROOT,
          "%-30s %-15s %9d %10.2e %10.2e %8.4f %s",
          one.name(),
          one.kind(),
          found.evaluations(),
          error,
          found.errorBound(),
          error / found.errorBound(),
          found.status());
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-4, 1e-6, 1e-8, 1e-10})
  void trueErrorLiesWithinTheBoundAtEveryRequest(double request) throws IOException {
    List<Outcome> outcomes = battery().stream().map(one -> Outcome.of(one, request)).toList();
    List<String> lines = new ArrayList<>();
    lines.add(
        String.format(
            "%-30s %-15s %9s %10s %10s %8s",
            "integral, request " + request, "kind", "points", "error", "bound", "ratio"));
    outcomes.forEach(o -> lines.add(o.line()));
    double worst =
        outcomes.stream().mapToDouble(o -> o.error() / o.found().errorBound()).max().orElseThrow();
    lines.add(String.format(Locale.ROOT, "worst ratio of error to bound: %.4f", worst));
    Files.createDirectories(Path.of("target"));
    Files.write(Path.of("target", "battery-" + request + ".txt"), lines);
    assertTrue(outcomes.size() >= FEWEST, "battery of " + outcomes.size());
    assertAll(
        outcomes.stream()
            .map(
                o -> (Executable) () -> assertTrue(o.error() <= o.found().errorBound(), o.line())));
  }

  @Test
  void boundOfSmoothIntegralsIsWithinTenTimesTheRequest() {
    List<Executable> checks = new ArrayList<>();
    for (double request : new double[] {1e-4, 1e-6, 1e-8, 1e-10}) {
      for (BatteryCase one : battery()) {
        if (one.kind() == BatteryCase.Kind.SMOOTH || one.kind() == BatteryCase.Kind.OSCILLATING) {
          Outcome o = Outcome.of(one, request);
          checks.add(
              () ->
                  assertTrue(
                      o.found().errorBound() <= TIGHT * request * o.found().magnitude(),
                      request + ": " + o.line()));
        }
      }
    }
    assertAll(checks);
  }

  @Test
  void switchingIntegralsReachTheRequestLikeSmoothOnes() {
    assertAll(
        battery().stream()
            .filter(
                one ->
                    one.kind() == BatteryCase.Kind.KINKED || one.kind() == BatteryCase.Kind.JUMPING)
            .map(one -> Outcome.of(one, 1e-10))
            .map(o -> (Executable) () -> assertTrue(o.found().reached(), o.line())));
  }
}
