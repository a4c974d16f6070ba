package org.hullsum.flux;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.concurrent.TimeUnit;
import org.hullsum.expression.Expression;
import org.hullsum.expression.ExpressionParser;
import org.hullsum.expression.VectorExpression;
import org.hullsum.mesh.MeshFile;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.model.Inputs;
import org.hullsum.units.WorkingUnits;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** The integrals over one mesh, each with its error bound, on one thread. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 2, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(1)
public class MeshKernelsBenchmark {
  @Param("mesh.stl")
  private String file;

  private TriangleMesh mesh;
  private MeshFlux linear;
  private MeshFlux cubic;
  private MeshFlux smooth;

  @Setup
  public void read() throws Exception {
    mesh = MeshFile.read(Path.of(file), 2).build(1);
    linear = flux("x + 2*y", "y - z", "3*z + 1");
    cubic = flux("x^3 + y^2", "y*z^2", "z^2*x + 2*z");
    smooth = flux("exp(-x^2)*sin(3*y)", "y*z", "z^3/(1 + x^2)");
  }

  private MeshFlux flux(String... components) throws Exception {
    return MeshFlux.of(
        mesh,
        new VectorExpression(
            component(components[0]), component(components[1]), component(components[2])),
        InputSensitivity.of(new Inputs(Map.of(), List.of())),
        1e-8);
  }

  private static Expression component(String text) throws Exception {
    return ExpressionParser.parse(text, List.of("x", "y", "z"), WorkingUnits.NONE).root();
  }

  /** Area, area vector, the nine moments with the volume, and the mean squares: all at once. */
  @Benchmark
  public PatchGeometry geometry() {
    return MeshSums.of(mesh);
  }

  @Benchmark
  public PatchFlux fluxOfALinearField() {
    return linear.at(OptionalDouble.empty());
  }

  @Benchmark
  public PatchFlux fluxOfACubicField() {
    return cubic.at(OptionalDouble.empty());
  }

  @Benchmark
  public PatchFlux fluxOfASmoothField() {
    return smooth.at(OptionalDouble.empty());
  }
}
