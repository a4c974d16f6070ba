package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Connective;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Relation;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * A solid that trims surfaces, in the coordinates of the case. Its condition is a conjunction of
 * smooth inequalities in {@code x y z}.
 *
 * <p>Solids are closed: their flat faces and caps belong to them, also where a surface lies in such
 * a face and rounding would decide. For this the flat faces stand outward by 1e-12 of the solid's
 * extent.
 */
public sealed interface Body {
  /**
   * The condition in {@code x y z} that holds inside.
   *
   * @throws SurfaceFault where the figures describe no such solid
   */
  Expression condition(Map<String, Double> parameters) throws SurfaceFault;

  private static Expression atMost(Expression left, Expression right) {
    return new Comparison(Relation.LESS_OR_EQUAL, left, right);
  }

  /** That a coordinate which is 0 at one face and 1 at the other is between them. */
  private static List<Expression> between(Expression fraction) {
    return List.of(
        new Comparison(Relation.GREATER_OR_EQUAL, fraction, Expression.number(-Tolerance.ROUNDING)),
        atMost(fraction, Expression.number(1 + Tolerance.ROUNDING)));
  }

  private static Expression square(Expression e) {
    return e.power(2);
  }

  private static Expression all(List<Expression> conditions) {
    return new Logical(Connective.AND, conditions);
  }

  /** From circle to circle, caps included. */
  record Cylinder(VectorExpression from, VectorExpression to, Expression radius) implements Body {
    public Cylinder {
      Objects.requireNonNull(from, "from");
      Objects.requireNonNull(to, "to");
      Objects.requireNonNull(radius, "radius");
    }

    @Override
    public Expression condition(Map<String, Double> parameters) throws SurfaceFault {
      new Figures(parameters).positive("radius", radius);
      return new Cone(from, to, radius, radius).condition(parameters);
    }
  }

  /** From circle to circle, caps included; one radius may be zero. */
  record Cone(
      VectorExpression from, VectorExpression to, Expression radiusFrom, Expression radiusTo)
      implements Body {
    public Cone {
      Objects.requireNonNull(from, "from");
      Objects.requireNonNull(to, "to");
      Objects.requireNonNull(radiusFrom, "radiusFrom");
      Objects.requireNonNull(radiusTo, "radiusTo");
    }

    @Override
    public Expression condition(Map<String, Double> parameters) throws SurfaceFault {
      Figures figures = new Figures(parameters);
      figures.value("from", from);
      double first = figures.notNegative("radii", radiusFrom);
      double second = figures.notNegative("radii", radiusTo);
      if (first == 0 && second == 0) {
        throw new SurfaceFault("radii", "both radii are zero; only one end may be an apex");
      }
      VectorExpression path = to.minus(from);
      Frame frame = Frame.along(path, Optional.empty(), figures);
      VectorExpression offset = VectorExpression.position().minus(from);
      Expression fraction = offset.dot(path).over(path.dot(path));
      Expression distance =
          square(offset.dot(frame.zero())).plus(square(offset.dot(frame.quarter())));
      List<Expression> caps = between(fraction);
      Expression limit = square(new Span(radiusFrom, radiusTo).at(fraction));
      return all(List.of(atMost(distance, limit), caps.get(0), caps.get(1)));
    }
  }

  /** A ball. */
  record Sphere(VectorExpression centre, Expression radius) implements Body {
    public Sphere {
      Objects.requireNonNull(centre, "centre");
      Objects.requireNonNull(radius, "radius");
    }

    @Override
    public Expression condition(Map<String, Double> parameters) throws SurfaceFault {
      Figures figures = new Figures(parameters);
      figures.value("centre", centre);
      figures.positive("radius", radius);
      VectorExpression offset = VectorExpression.position().minus(centre);
      Expression distance = square(offset.x()).plus(square(offset.y())).plus(square(offset.z()));
      return atMost(distance, square(radius));
    }
  }

  /** With axes along x, y and z. */
  record Ellipsoid(VectorExpression centre, VectorExpression semiAxes) implements Body {
    public Ellipsoid {
      Objects.requireNonNull(centre, "centre");
      Objects.requireNonNull(semiAxes, "semiAxes");
    }

    @Override
    public Expression condition(Map<String, Double> parameters) throws SurfaceFault {
      Figures figures = new Figures(parameters);
      figures.value("centre", centre);
      figures.positive("semi-axes", semiAxes.x());
      figures.positive("semi-axes", semiAxes.y());
      figures.positive("semi-axes", semiAxes.z());
      VectorExpression offset = VectorExpression.position().minus(centre);
      Expression sum =
          square(offset.x().over(semiAxes.x()))
              .plus(square(offset.y().over(semiAxes.y())))
              .plus(square(offset.z().over(semiAxes.z())));
      return atMost(sum, Expression.number(1));
    }
  }

  /** A corner and three edges that start there, not in one plane. */
  record Box(
      VectorExpression corner,
      VectorExpression firstEdge,
      VectorExpression secondEdge,
      VectorExpression thirdEdge)
      implements Body {
    public Box {
      Objects.requireNonNull(corner, "corner");
      Objects.requireNonNull(firstEdge, "firstEdge");
      Objects.requireNonNull(secondEdge, "secondEdge");
      Objects.requireNonNull(thirdEdge, "thirdEdge");
    }

    @Override
    public Expression condition(Map<String, Double> parameters) throws SurfaceFault {
      Figures figures = new Figures(parameters);
      figures.value("corner", corner);
      Vector3 a = figures.value("edges", firstEdge);
      Vector3 b = figures.value("edges", secondEdge);
      Vector3 c = figures.value("edges", thirdEdge);
      double volume = Math.abs(a.dot(b.cross(c)));
      if (!(volume > Tolerance.ROUNDING * a.norm() * b.norm() * c.norm())) {
        throw new SurfaceFault(
            "edges", "the three edges span no volume; state three that are not in one plane");
      }
      List<Expression> first = between(fraction(firstEdge, secondEdge, thirdEdge));
      List<Expression> second = between(fraction(secondEdge, thirdEdge, firstEdge));
      List<Expression> third = between(fraction(thirdEdge, firstEdge, secondEdge));
      return all(
          List.of(
              first.get(0),
              first.get(1),
              second.get(0),
              second.get(1),
              third.get(0),
              third.get(1)));
    }

    /** How far along an edge a position is, the two others leaving it unchanged. */
    private Expression fraction(VectorExpression edge, VectorExpression b, VectorExpression c) {
      VectorExpression across = b.cross(c).simplified();
      VectorExpression offset = VectorExpression.position().minus(corner);
      return offset.dot(across).over(edge.dot(across));
    }
  }

  /** Everything behind a plane, seen along its normal. */
  record HalfSpace(VectorExpression through, Vector3 normal) implements Body {
    public HalfSpace {
      Objects.requireNonNull(through, "through");
      Objects.requireNonNull(normal, "normal");
    }

    @Override
    public Expression condition(Map<String, Double> parameters) throws SurfaceFault {
      new Figures(parameters).value("through", through);
      VectorExpression unit = VectorExpression.of(Figures.direction("normal", normal));
      return atMost(VectorExpression.position().minus(through).dot(unit), Expression.number(0));
    }
  }

  /** Where a condition in {@code x y z} holds. */
  record Where(Expression condition) implements Body {
    public Where {
      Objects.requireNonNull(condition, "condition");
    }

    @Override
    public Expression condition(Map<String, Double> parameters) {
      return condition;
    }
  }
}
