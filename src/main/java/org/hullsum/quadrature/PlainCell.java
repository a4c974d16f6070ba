package org.hullsum.quadrature;

/** The whole unit square, its own coordinates being u and v. */
final class PlainCell implements Cell {
  private final SquareProblem problem;
  private final GridBlocks blocks;
  private final SignWatch watch;

  /** A cell over which the functions {@code watched} are expected to keep their signs. */
  PlainCell(SquareProblem problem, SwitchFunctions watched) {
    this.problem = problem;
    blocks = new GridBlocks(problem.integrand());
    watch = new SignWatch(watched);
  }

  @Override
  public int components() {
    return problem.integrand().components();
  }

  @Override
  public boolean periodicX() {
    return problem.periodicU();
  }

  @Override
  public boolean periodicY() {
    return problem.periodicV();
  }

  @Override
  public boolean sample(int nx, double[] x, int ny, double[] y, double[][] values) {
    blocks.begin(values);
    for (int i = 0; i < nx; i++) {
      for (int j = 0; j < ny; j++) {
        blocks.add(x[i], y[j]);
        watch.add(x[i], y[j]);
      }
    }
    blocks.finish();
    return watch.finish();
  }

  @Override
  public double rounding() {
    return 0;
  }

  @Override
  public ParameterPoint surprise() {
    return watch.place();
  }

  @Override
  public ParameterPoint place(double x, double y) {
    return new ParameterPoint(x, y);
  }
}
