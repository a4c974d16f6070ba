package org.hullsum.field;

import java.util.List;
import java.util.Map;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Simplifier;
import org.hullsum.expression.Substitution;
import org.hullsum.expression.VectorExpression;

/** What is done to each component of a vector of formulas. */
final class Algebra3 {
  private Algebra3() {}

  static VectorExpression simplified(VectorExpression v) {
    return new VectorExpression(
        Simplifier.simplify(v.x()), Simplifier.simplify(v.y()), Simplifier.simplify(v.z()));
  }

  static VectorExpression replace(VectorExpression v, Map<String, Expression> replacements) {
    return new VectorExpression(
        Substitution.replace(v.x(), replacements),
        Substitution.replace(v.y(), replacements),
        Substitution.replace(v.z(), replacements));
  }

  static List<Expression> components(VectorExpression v) {
    return List.of(v.x(), v.y(), v.z());
  }
}
