package org.hullsum.expression;

import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.AtomTable.Branches;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Connective;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Operator;
import org.hullsum.expression.Expression.Symbol;

/** Brings an expression into the normal form of the simplifier, each shared part once. */
final class Reduction implements Expression.Visitor<Polynomial> {
  private static final Coefficient MINUS_ONE = Coefficient.of(-1);

  private final AtomTable atoms = new AtomTable();
  private final Effort effort;
  private final Products products;
  private final ShortestForm shortest;
  private final FunctionRules rules;
  private final Map<Expression, Polynomial> done = new IdentityHashMap<>();

  Reduction(Effort effort) {
    this.effort = effort;
    this.products = new Products(atoms, effort);
    this.shortest = new ShortestForm(atoms, products);
    this.rules = new FunctionRules(atoms, products, shortest);
  }

  /** The simplified expression, written out. */
  Expression simplified(Expression e) {
    return atoms.assembly().expression(shortest.of(of(e)));
  }

  private Polynomial of(Expression e) {
    Polynomial known = done.get(e);
    if (known == null) {
      known = effort.spend(1) ? e.accept(this) : Polynomial.ZERO;
      effort.spend(known.size());
      done.put(e, known);
    }
    return known;
  }

  private Polynomial settled(Expression e) {
    return shortest.of(of(e));
  }

  private Polynomial whole(Expression e) {
    return Products.of(atoms.whole(e));
  }

  @Override
  public Polynomial constant(Constant constant) {
    if (!Double.isFinite(constant.value())) {
      return whole(constant);
    }
    boolean plain = constant.dimension().isEmpty() && constant.text().isEmpty();
    return plain || constant.value() == 0
        ? Polynomial.of(Coefficient.of(constant.value()))
        : whole(constant);
  }

  @Override
  public Polynomial symbol(Symbol symbol) {
    return whole(symbol);
  }

  @Override
  public Polynomial negation(Negation negation) {
    return of(negation.operand()).negated();
  }

  @Override
  public Polynomial binary(Binary b) {
    Polynomial left = of(b.left());
    return switch (b.operator()) {
      case ADD -> left.plus(of(b.right()));
      case SUBTRACT -> left.minus(of(b.right()));
      case MULTIPLY -> products.product(left, of(b.right()));
      case DIVIDE -> products.product(left, power(of(b.right()), MINUS_ONE));
      case POWER -> power(left, settled(b.right()));
    };
  }

  private Polynomial power(Polynomial base, Polynomial exponent) {
    Optional<Coefficient> number = exponent.constant();
    return number.isPresent()
        ? power(base, number.get())
        : Products.of(atoms.power(shortest.of(base), exponent));
  }

  private Polynomial power(Polynomial base, Coefficient exponent) {
    if (base.isZero() && exponent.isNegative()) {
      return whole(new Binary(Operator.POWER, Algebra.ZERO, Expression.number(exponent.value())));
    }
    return products.power(exponent.isWhole() ? base : shortest.underRoot(base), exponent);
  }

  @Override
  public Polynomial call(Call call) {
    List<Polynomial> arguments = new ArrayList<>();
    for (Expression argument : call.arguments()) {
      arguments.add(settled(argument));
    }
    return rules.call(call.function(), arguments);
  }

  @Override
  public Polynomial comparison(Comparison c) {
    if (!isTotal(c.left()) || !isTotal(c.right())) {
      return whole(c);
    }
    Polynomial left = settled(c.left());
    Polynomial right = settled(c.right());
    Optional<Coefficient> difference = left.minus(right).constant();
    if (difference.isPresent()) {
      double holds = Operation.of(c.relation()).apply(difference.get().value(), 0, 0);
      return Polynomial.of(Coefficient.of(holds));
    }
    Assembly assembly = atoms.assembly();
    return Products.of(
        atoms.structure(
            c.relation(),
            List.of(left, right),
            new Comparison(c.relation(), assembly.expression(left), assembly.expression(right))));
  }

  /**
   * Whether an expression has a value everywhere. A comparison with what has none does not hold, so
   * in other comparisons nothing may be changed.
   */
  private static boolean isTotal(Expression e) {
    return Symbols.parts(e).stream().allMatch(Reduction::hasValueWhereItsPartsHave);
  }

  private static boolean hasValueWhereItsPartsHave(Expression e) {
    if (e instanceof Binary b) {
      return switch (b.operator()) {
        case ADD, SUBTRACT, MULTIPLY -> true;
        case DIVIDE -> Algebra.plain(b.right()).filter(v -> v != 0).isPresent();
        case POWER -> Algebra.plain(b.right()).filter(v -> v >= 0 && v == Math.rint(v)).isPresent();
      };
    }
    if (e instanceof Call call) {
      return switch (call.function()) {
        case TAN, ASIN, ACOS, LN, LOG10, SQRT -> false;
        default -> true;
      };
    }
    return true;
  }

  @Override
  public Polynomial logical(Logical logical) {
    boolean all = logical.connective() == Connective.AND;
    boolean not = logical.connective() == Connective.NOT;
    List<Object> open = new ArrayList<>();
    List<Expression> written = new ArrayList<>();
    for (Expression condition : logical.conditions()) {
      Polynomial part = of(condition);
      Optional<Coefficient> decided = part.constant();
      if (decided.isEmpty()) {
        open.add(part);
        written.add(atoms.assembly().expression(part));
      } else if (not || decided.get().isZero() == all) {
        return Polynomial.of(decided.get().isZero() == not ? Coefficient.ONE : Coefficient.ZERO);
      }
    }
    if (open.isEmpty()) {
      return all ? Polynomial.ONE : Polynomial.ZERO;
    }
    return open.size() == 1 && !not
        ? (Polynomial) open.get(0)
        : Products.of(
            atoms.structure(
                logical.connective(), open, new Logical(logical.connective(), written)));
  }

  @Override
  public Polynomial conditional(Conditional c) {
    Polynomial condition = of(c.condition());
    Optional<Coefficient> decided = condition.constant();
    if (decided.isPresent()) {
      return of(decided.get().isZero() ? c.otherwise() : c.then());
    }
    Polynomial then = settled(c.then());
    Polynomial otherwise = settled(c.otherwise());
    if (then.equals(otherwise)) {
      return then;
    }
    return Products.of(atoms.conditional(new Branches(condition, then, otherwise)));
  }
}
