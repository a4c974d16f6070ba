package org.hullsum.casefile;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Symbol;

/** Finds bare numbers: alone, with a sign, or as a term of a formula's outermost sum. */
final class BareNumbers {
  /** Two scales that differ by less are the same unit written in two ways. */
  private static final double SAME_SCALE = 1e-12;

  private BareNumbers() {}

  static boolean sameScale(double factor) {
    return Math.abs(factor - 1) <= SAME_SCALE;
  }

  /** The value of a bare number, with its sign. */
  static Optional<Double> value(Expression e) {
    return e.accept(new Alone());
  }

  /** A term of the outermost sum that is a bare number other than zero. */
  static Optional<Expression> inSum(Expression root) {
    Deque<Expression> open = new ArrayDeque<>(List.of(root));
    boolean sum = false;
    while (!open.isEmpty()) {
      Expression next = open.pop();
      List<Expression> terms = next.accept(new Terms());
      sum |= terms.size() > 1;
      if (sum && value(next).filter(v -> v != 0).isPresent()) {
        return Optional.of(next);
      }
      if (value(next).isEmpty()) {
        terms.forEach(open::push);
      }
    }
    return Optional.empty();
  }

  /** Answers for everything but what a subclass names. */
  private abstract static class Otherwise<R> implements Expression.Visitor<R> {
    abstract R otherwise();

    @Override
    public R constant(Constant constant) {
      return otherwise();
    }

    @Override
    public R symbol(Symbol symbol) {
      return otherwise();
    }

    @Override
    public R negation(Negation negation) {
      return otherwise();
    }

    @Override
    public R binary(Binary binary) {
      return otherwise();
    }

    @Override
    public R call(Call call) {
      return otherwise();
    }

    @Override
    public R comparison(Comparison comparison) {
      return otherwise();
    }

    @Override
    public R logical(Logical logical) {
      return otherwise();
    }

    @Override
    public R conditional(Conditional conditional) {
      return otherwise();
    }
  }

  private static final class Alone extends Otherwise<Optional<Double>> {
    @Override
    Optional<Double> otherwise() {
      return Optional.empty();
    }

    @Override
    public Optional<Double> constant(Constant constant) {
      return constant.dimension().isEmpty() && constant.text().isEmpty()
          ? Optional.of(constant.value())
          : Optional.empty();
    }

    @Override
    public Optional<Double> negation(Negation negation) {
      return value(negation.operand()).map(v -> -v);
    }
  }

  /** The operands whose unit is that of the whole. */
  private static final class Terms extends Otherwise<List<Expression>> {
    @Override
    List<Expression> otherwise() {
      return List.of();
    }

    @Override
    public List<Expression> negation(Negation negation) {
      return negation.children();
    }

    @Override
    public List<Expression> binary(Binary binary) {
      return switch (binary.operator()) {
        case ADD, SUBTRACT -> binary.children();
        case MULTIPLY, DIVIDE, POWER -> List.of();
      };
    }

    @Override
    public List<Expression> call(Call call) {
      return switch (call.function()) {
        case MIN, MAX, HYPOT -> call.children();
        case ABS -> call.children();
        default -> List.of();
      };
    }

    @Override
    public List<Expression> conditional(Conditional conditional) {
      return List.of(conditional.then(), conditional.otherwise());
    }
  }
}
