package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.stream.Stream;
import org.hullsum.expression.Expression;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class ColumnRouteTest {
  private static Optional<DensityOutcome> columns(List<BoundaryPatch> boundary, Expression g) {
    double size = EnclosedRegion.of(boundary).box().diagonal();
    return new ColumnRoute(boundary, List.of(g), Map.of(), OptionalDouble.empty(), size)
        .integrate(1e-9, 0, 30_000);
  }

  static Stream<Assembly> assemblies() {
    return Stream.concat(
        Assemblies.random(new Random(41)).stream(), Assemblies.random(new Random(42)).stream());
  }

  @ParameterizedTest
  @MethodSource("assemblies")
  void volumeByColumnsEqualsTheVolumeByMoments(Assembly assembly) {
    DensityOutcome outcome =
        columns(VolumeIntegratorTest.boundary(assembly), Expression.number(1)).orElseThrow();
    assertEquals(
        assembly.volume(), outcome.values().get(0), outcome.errorBounds().get(0), "" + outcome);
  }

  @ParameterizedTest
  @MethodSource("assemblies")
  void densityByColumnsEqualsTheDensityByCones(Assembly assembly) {
    List<BoundaryPatch> boundary = VolumeIntegratorTest.boundary(assembly);
    Expression g = TestFields.parse("exp(0.3*x)*cos(y) + z^2*x");
    DensityOutcome byColumns = columns(boundary, g).orElseThrow();
    VolumeIntegral byCones =
        new VolumeIntegrator(TestFields.noInputs(), 10)
            .integrate(boundary, g, OptionalDouble.empty(), 0);
    assertEquals(
        byCones.value().orElseThrow(),
        byColumns.values().get(0),
        byColumns.errorBounds().get(0) + byCones.errorBound(),
        "" + byColumns);
  }

  @Test
  void columnsReachTheAccuracyOnNearlyAllAssemblies() {
    long reached =
        assemblies()
            .filter(
                a ->
                    columns(VolumeIntegratorTest.boundary(a), Expression.number(1))
                        .orElseThrow()
                        .reached())
            .count();
    assertTrue(reached >= assemblies().count() - 2, reached + " reached");
  }

  @Test
  void wrongFacingIsContradicted() {
    List<BoundaryPatch> right =
        VolumeIntegratorTest.boundary(Assemblies.box(new Vector3(0, 0, 0), new Vector3(1, 1, 1)));
    List<BoundaryPatch> wrong = new ArrayList<>(right);
    BoundaryPatch turned = right.get(2);
    wrong.set(2, new BoundaryPatch(turned.surface(), turned.geometry(), -turned.outward()));
    Columns columns = new Columns(new BoundaryLines(wrong, Map.of()), Vector3.X, 1);
    columns.below(new Vector3(0, 0.4, 0.3));
    assertTrue(columns.contradicted());
  }
}
