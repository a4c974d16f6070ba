package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Body;
import org.hullsum.geometry.ConeShape;
import org.hullsum.geometry.CylinderShape;
import org.hullsum.geometry.DiskShape;
import org.hullsum.geometry.EllipsoidShape;
import org.hullsum.geometry.Placement;
import org.hullsum.geometry.Profile;
import org.hullsum.geometry.RectangleShape;
import org.hullsum.geometry.RevolutionShape;
import org.hullsum.geometry.Shape;
import org.hullsum.geometry.Span;
import org.hullsum.geometry.SphereShape;
import org.hullsum.geometry.Surface;
import org.hullsum.geometry.SurfaceFault;
import org.hullsum.geometry.TorusShape;
import org.hullsum.geometry.Trim;
import org.hullsum.numeric.Vector3;

/** Closed surfaces for the tests, each a list of patches with the sign that makes it outward. */
public final class Assemblies {
  private static final Map<String, Double> NO_PARAMETERS = Map.of();

  private Assemblies() {}

  /**
   * A patch of a closed surface.
   *
   * @param surface with its construction normal
   * @param outward +1 where the construction normal points out, else −1
   */
  public record Piece(Surface surface, int outward) {}

  /** A closed surface with its volume, where a formula gives it. */
  public record Assembly(String name, List<Piece> pieces, double volume) {
    @Override
    public String toString() {
      return name;
    }
  }

  public static Expression number(double value) {
    return Expression.number(value);
  }

  public static VectorExpression point(double x, double y, double z) {
    return VectorExpression.of(new Vector3(x, y, z));
  }

  public static Surface build(Shape shape) {
    try {
      return shape.surface(NO_PARAMETERS);
    } catch (SurfaceFault fault) {
      throw new IllegalStateException(fault);
    }
  }

  public static Surface placed(Surface surface, Placement placement) {
    try {
      return placement.placed(surface, NO_PARAMETERS);
    } catch (SurfaceFault fault) {
      throw new IllegalStateException(fault);
    }
  }

  public static Surface trimmed(Surface surface, List<Body> inside, List<Body> outside) {
    try {
      return new Trim(inside, outside).trimmed(surface, NO_PARAMETERS);
    } catch (SurfaceFault fault) {
      throw new IllegalStateException(fault);
    }
  }

  public static Surface rectangle(Vector3 corner, Vector3 a, Vector3 b) {
    return build(
        new RectangleShape(
            VectorExpression.of(corner), VectorExpression.of(a), VectorExpression.of(b)));
  }

  public static Surface disk(Vector3 centre, Vector3 normal, double radius) {
    return build(
        new DiskShape(
            VectorExpression.of(centre),
            normal,
            number(radius),
            Optional.empty(),
            Optional.empty(),
            Optional.empty()));
  }

  public static Surface ring(Vector3 centre, Vector3 normal, double radius, double hole) {
    return build(
        new DiskShape(
            VectorExpression.of(centre),
            normal,
            number(radius),
            Optional.of(number(hole)),
            Optional.empty(),
            Optional.empty()));
  }

  public static Surface cylinder(Vector3 from, Vector3 to, double radius) {
    return build(
        new CylinderShape(
            VectorExpression.of(from),
            VectorExpression.of(to),
            number(radius),
            Optional.empty(),
            Optional.empty()));
  }

  public static Surface sphere(Vector3 centre, double radius) {
    return build(
        new SphereShape(
            VectorExpression.of(centre),
            number(radius),
            Vector3.Z,
            Optional.empty(),
            Optional.empty(),
            Optional.empty()));
  }

  /** A box between two corners. */
  public static Assembly box(Vector3 low, Vector3 high) {
    Vector3 size = high.minus(low);
    Vector3 a = Vector3.X.times(size.x());
    Vector3 b = Vector3.Y.times(size.y());
    Vector3 c = Vector3.Z.times(size.z());
    return new Assembly(
        "box",
        List.of(
            new Piece(rectangle(low, b, a), 1),
            new Piece(rectangle(low.plus(c), a, b), 1),
            new Piece(rectangle(low, c, b), 1),
            new Piece(rectangle(low.plus(a), b, c), 1),
            new Piece(rectangle(low, a, c), 1),
            new Piece(rectangle(low.plus(b), c, a), 1)),
        size.x() * size.y() * size.z());
  }

  /** A cylinder along z with its two disks. */
  public static Assembly can(double radius, double bottom, double top) {
    Vector3 from = Vector3.Z.times(bottom);
    Vector3 to = Vector3.Z.times(top);
    return new Assembly(
        "can",
        List.of(
            new Piece(cylinder(from, to, radius), 1),
            new Piece(disk(from, Vector3.Z.negated(), radius), 1),
            new Piece(disk(to, Vector3.Z, radius), 1)),
        Math.PI * radius * radius * (top - bottom));
  }

  /** A cone frustum along z from radius a at the bottom to b at the top; a full cone for b = 0. */
  public static Assembly frustum(double a, double b, double bottom, double top) {
    Vector3 from = Vector3.Z.times(bottom);
    Vector3 to = Vector3.Z.times(top);
    List<Piece> pieces = new ArrayList<>();
    pieces.add(
        new Piece(
            build(
                new ConeShape(
                    VectorExpression.of(from),
                    VectorExpression.of(to),
                    number(a),
                    number(b),
                    Optional.empty(),
                    Optional.empty())),
            1));
    pieces.add(new Piece(disk(from, Vector3.Z.negated(), a), 1));
    if (b > 0) {
      pieces.add(new Piece(disk(to, Vector3.Z, b), 1));
    }
    return new Assembly("frustum", pieces, Math.PI * (top - bottom) * (a * a + a * b + b * b) / 3);
  }

  public static Assembly ball(Vector3 centre, double radius) {
    return new Assembly(
        "ball",
        List.of(new Piece(sphere(centre, radius), 1)),
        4 * Math.PI * radius * radius * radius / 3);
  }

  /** The region between two spheres. */
  public static Assembly shell(double inner, double outer) {
    return new Assembly(
        "shell",
        List.of(
            new Piece(sphere(Vector3.ZERO, outer), 1), new Piece(sphere(Vector3.ZERO, inner), -1)),
        4 * Math.PI * (outer * outer * outer - inner * inner * inner) / 3);
  }

  /** The region between two cylinders and two rings. */
  public static Assembly hollowCan(double inner, double outer, double height) {
    Vector3 to = Vector3.Z.times(height);
    return new Assembly(
        "hollow can",
        List.of(
            new Piece(cylinder(Vector3.ZERO, to, outer), 1),
            new Piece(cylinder(Vector3.ZERO, to, inner), -1),
            new Piece(ring(Vector3.ZERO, Vector3.Z.negated(), outer, inner), 1),
            new Piece(ring(to, Vector3.Z, outer, inner), 1)),
        Math.PI * (outer * outer - inner * inner) * height);
  }

  public static Assembly ellipsoid(double a, double b, double c) {
    return new Assembly(
        "ellipsoid",
        List.of(
            new Piece(
                build(
                    new EllipsoidShape(
                        point(0, 0, 0), point(a, b, c), Optional.empty(), Optional.empty())),
                1)),
        4 * Math.PI * a * b * c / 3);
  }

  public static Assembly torus(double ring, double tube) {
    return new Assembly(
        "torus",
        List.of(
            new Piece(
                build(
                    new TorusShape(
                        point(0, 0, 0),
                        Vector3.Z,
                        number(ring),
                        number(tube),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.empty())),
                1)),
        2 * Math.PI * Math.PI * ring * tube * tube);
  }

  /** A vessel of revolution with a spindle shape: radius R sin(π s), height H s. */
  public static Assembly spindle(double radius, double height) {
    Expression s = Expression.symbol("s");
    Expression angle = number(Math.PI).times(s);
    Shape shape =
        new RevolutionShape(
            new Profile.Curve(
                number(radius).times(Expression.call(org.hullsum.expression.Function.SIN, angle)),
                number(height).times(s),
                Span.of(0, 1)),
            point(0, 0, 0),
            Vector3.Z,
            Optional.empty(),
            Optional.empty());
    return new Assembly(
        "spindle", List.of(new Piece(build(shape), 1)), Math.PI * radius * radius * height / 2);
  }

  /** A cylindrical shell with a branch pipe on its side, opening into it. */
  public static Assembly branch() {
    Vector3 bottom = new Vector3(0, 0, -2);
    Vector3 top = new Vector3(0, 0, 2);
    Vector3 end = new Vector3(2.5, 0, 0);
    Body branch = new Body.Cylinder(point(0, 0, 0), VectorExpression.of(end), number(0.4));
    Body shell =
        new Body.Cylinder(VectorExpression.of(bottom), VectorExpression.of(top), number(1));
    return new Assembly(
        "branch",
        List.of(
            new Piece(trimmed(cylinder(bottom, top, 1), List.of(), List.of(branch)), 1),
            new Piece(trimmed(cylinder(Vector3.ZERO, end, 0.4), List.of(), List.of(shell)), 1),
            new Piece(disk(bottom, Vector3.Z.negated(), 1), 1),
            new Piece(disk(top, Vector3.Z, 1), 1),
            new Piece(disk(end, Vector3.X, 0.4), 1)),
        Double.NaN);
  }

  /** All kinds, with sizes drawn at random. */
  public static List<Assembly> random(Random random) {
    double a = 0.5 + random.nextDouble();
    double b = 0.5 + random.nextDouble();
    double c = 0.5 + random.nextDouble();
    return List.of(
        box(new Vector3(-a, -b, -c), new Vector3(b, c, a)),
        can(a, -b, c),
        frustum(a, 0.4 * b, -c, b),
        ball(new Vector3(a - 1, b - 1, c - 1), a),
        shell(0.3 * a, a),
        hollowCan(0.4 * a, a, c),
        ellipsoid(a, b, c),
        torus(1 + a, 0.5 * b),
        spindle(a, 2 * b));
  }

  /** A placement with a random turn and move. */
  public static Placement randomPlacement(Random random) {
    Vector3 about =
        new Vector3(random.nextGaussian(), random.nextGaussian(), random.nextGaussian());
    Vector3 move = new Vector3(random.nextGaussian(), random.nextGaussian(), random.nextGaussian());
    return new Placement(
        Optional.of(new Placement.Turn(about, number(3 * random.nextDouble()))),
        Optional.of(VectorExpression.of(move)));
  }

  /** The same surface moved as a rigid body. */
  public static Assembly moved(Assembly assembly, Placement placement) {
    return new Assembly(
        assembly.name(),
        assembly.pieces().stream()
            .map(p -> new Piece(placed(p.surface(), placement), p.outward()))
            .toList(),
        assembly.volume());
  }
}
