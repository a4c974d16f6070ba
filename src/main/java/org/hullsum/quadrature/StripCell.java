package org.hullsum.quadrature;

/**
 * The part of the unit square between two neighbouring switch curves, over an interval of the outer
 * coordinate on which the curves neither begin, end nor cross.
 *
 * <p>Its x runs along the outer coordinate, its y from one curve to the next. Where a curve turns
 * back at an end of the interval it behaves like a square root there, which {@link EndMap} removes.
 */
final class StripCell implements Cell {
  /** Error of a root: its own rounding and that of the switch function near it. */
  private static final double ROOT_ERROR = 16 * Math.ulp(1.0);

  private final SquareProblem problem;
  private final RowRoots roots;
  private final GridBlocks blocks;
  private final double from;
  private final double to;
  private final EndMap map;
  private final int strip;
  private final int strips;
  private final long signature;
  private final boolean wholeOuter;
  private final double rounding;
  private double[] jacobian = new double[0];
  private double surprising;

  /**
   * @param from where the outer interval begins
   * @param to where it ends
   * @param map for the ends of the interval
   * @param strip which of the strips of the interval's rows
   * @param like a row of the interval
   */
  StripCell(
      SquareProblem problem,
      RowRoots roots,
      double from,
      double to,
      EndMap map,
      int strip,
      Row like) {
    this.problem = problem;
    this.roots = roots;
    this.from = from;
    this.to = to;
    this.map = map;
    this.strip = strip;
    strips = like.strips();
    signature = like.signature();
    blocks = new GridBlocks(problem.integrand());
    wholeOuter = from == 0 && to == 1;
    double width = like.end(strip) - like.begin(strip);
    rounding = strips == 1 ? 0 : Math.min(1, ROOT_ERROR / Math.max(width, Double.MIN_NORMAL));
  }

  @Override
  public int components() {
    return problem.integrand().components();
  }

  @Override
  public boolean periodicX() {
    return wholeOuter && (roots.outerIsU() ? problem.periodicU() : problem.periodicV());
  }

  @Override
  public boolean periodicY() {
    return strips == 1 && (roots.outerIsU() ? problem.periodicV() : problem.periodicU());
  }

  @Override
  public boolean sample(int nx, double[] x, int ny, double[] y, double[][] values) {
    if (jacobian.length < nx) {
      jacobian = new double[nx];
    }
    blocks.begin(values);
    for (int i = 0; i < nx; i++) {
      double outer = outer(x[i]);
      Row row = roots.at(outer);
      if (row.signature() != signature) {
        surprising = outer;
        return false;
      }
      double begin = row.begin(strip);
      double width = row.end(strip) - begin;
      jacobian[i] = (to - from) * map.slope(x[i]) * width;
      for (int j = 0; j < ny; j++) {
        double inner = begin + width * y[j];
        blocks.add(roots.outerIsU() ? outer : inner, roots.outerIsU() ? inner : outer);
      }
    }
    blocks.finish();
    for (double[] component : values) {
      for (int i = 0; i < nx; i++) {
        for (int j = 0; j < ny; j++) {
          component[i * ny + j] *= jacobian[i];
        }
      }
    }
    return true;
  }

  private double outer(double x) {
    double part = map.position(x);
    return part < 0.5 ? from + (to - from) * part : to - (to - from) * (1 - part);
  }

  @Override
  public double rounding() {
    return rounding;
  }

  @Override
  public ParameterPoint surprise() {
    return roots.outerIsU()
        ? new ParameterPoint(surprising, 0.5)
        : new ParameterPoint(0.5, surprising);
  }

  @Override
  public ParameterPoint place(double x, double y) {
    double outer = outer(x);
    Row row = roots.at(outer);
    int there = Math.min(strip, row.strips() - 1);
    double inner = row.begin(there) + (row.end(there) - row.begin(there)) * y;
    return roots.outerIsU() ? new ParameterPoint(outer, inner) : new ParameterPoint(inner, outer);
  }
}
