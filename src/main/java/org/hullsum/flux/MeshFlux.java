package org.hullsum.flux;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Symbols;
import org.hullsum.expression.VectorExpression;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Integral;

/**
 * The flux of a field, or of a density along the normal, through the triangles of a mesh.
 * Derivatives by the inputs come along. Not thread-safe.
 */
final class MeshFlux implements FluxIntegrator.PreparedFlux {
  private static final long LIMIT = 20_000_000;

  /** Evaluations of each triangle that are always allowed. */
  private static final long EACH = 64;

  private final TriangleMesh mesh;
  private final List<Expression> formulas;
  private final int rows;
  private final FluxBasis basis;
  private final InputSensitivity inputs;
  private final double relative;
  private final List<String> varying;

  private MeshFlux(
      TriangleMesh mesh,
      List<Expression> components,
      FluxBasis basis,
      InputSensitivity inputs,
      double relative) {
    this.mesh = mesh;
    this.rows = components.size();
    this.basis = basis;
    this.inputs = inputs;
    this.relative = relative;
    this.varying = List.copyOf(inputs.varyingIn(components));
    this.formulas = new ArrayList<>(components);
    for (String name : varying) {
      components.forEach(c -> formulas.add(Derivative.of(c, name)));
    }
  }

  /** The flux of a field. */
  static MeshFlux of(
      TriangleMesh mesh, VectorExpression field, InputSensitivity inputs, double relative) {
    return new MeshFlux(
        mesh, List.of(field.x(), field.y(), field.z()), FluxBasis.FIELD, inputs, relative);
  }

  /** The flux of a density along the normal. */
  static MeshFlux along(
      TriangleMesh mesh,
      Expression density,
      FluxBasis basis,
      InputSensitivity inputs,
      double relative) {
    return new MeshFlux(mesh, List.of(density), basis, inputs, relative);
  }

  @Override
  public boolean dependsOnTime() {
    return formulas.stream().anyMatch(f -> Symbols.in(f).contains(InputSensitivity.TIME));
  }

  @Override
  public PatchFlux at(OptionalDouble instant) {
    Vector3 low = mesh.low();
    double size = mesh.high().minus(low).norm();
    int block =
        MeshIntegrator.BLOCK * (TriangleRule.DEGREE_5.size() + TriangleRule.DEGREE_8.size());
    Densities evaluated = new Densities(formulas, inputs.values(), instant, size, block);
    OptionalInt degree = evaluated.degree();
    MeshIntegrator integrator = new MeshIntegrator(new Dotted(evaluated, block), degree.orElse(-1));
    long limit = Math.max(LIMIT, EACH * mesh.triangleCount());
    integrator.integrate(mesh, relative, Double.MIN_NORMAL, limit);
    boolean finite = integrator.nonFiniteAt().isEmpty();
    Map<String, Double> partials = new LinkedHashMap<>();
    for (int k = 0; k < varying.size(); k++) {
      partials.put(varying.get(k), integrator.value(k + 1));
    }
    boolean reached =
        integrator.error() <= 2 * relative * integrator.magnitude() + Double.MIN_NORMAL;
    return new PatchFlux(
        finite ? Optional.of(integrator.value(0)) : Optional.empty(),
        finite ? integrator.error() : Double.POSITIVE_INFINITY,
        finite ? integrator.magnitude() : 0,
        finite ? inputs.toBases(partials) : Map.of(),
        integrator.evaluations(),
        !finite
            ? Integral.Status.NOT_FINITE
            : reached ? Integral.Status.REACHED : Integral.Status.NOT_REACHED,
        basis,
        integrator.nonFiniteAt());
  }

  /** F·N, or q|N|, and the same of each derivative. */
  private final class Dotted implements MeshIntegrator.Integrand {
    private final Densities evaluated;
    private final double[][] values;

    Dotted(Densities evaluated, int block) {
      this.evaluated = evaluated;
      this.values = new double[formulas.size()][block];
    }

    @Override
    public int components() {
      return 1 + varying.size();
    }

    @Override
    public void evaluate(int count, double[][] p, double[][] n, double[][] into) {
      evaluated.evaluate(count, p[0], p[1], p[2], values);
      for (int k = 0; k < components(); k++) {
        int at = rows * k;
        for (int i = 0; i < count; i++) {
          into[k][i] =
              rows == 1
                  ? values[at][i]
                      * Math.sqrt(n[0][i] * n[0][i] + n[1][i] * n[1][i] + n[2][i] * n[2][i])
                  : values[at][i] * n[0][i]
                      + values[at + 1][i] * n[1][i]
                      + values[at + 2][i] * n[2][i];
        }
      }
    }
  }
}
