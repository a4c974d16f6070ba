package org.hullsum.casefile;

import java.util.Optional;
import java.util.function.BiFunction;
import java.util.function.Function;

/** Makes one thing of several that were read, if every one of them could be. */
final class Together {
  private Together() {}

  /** A function of three. */
  @FunctionalInterface
  interface OfThree<A, B, C, R> {
    R apply(A a, B b, C c);
  }

  /** A function of four. */
  @FunctionalInterface
  interface OfFour<A, B, C, D, R> {
    R apply(A a, B b, C c, D d);
  }

  static <A, B, R> Optional<R> of(Optional<A> a, Optional<B> b, BiFunction<A, B, R> make) {
    return a.flatMap(first -> b.map(second -> make.apply(first, second)));
  }

  static <A, B, C, R> Optional<R> of(
      Optional<A> a, Optional<B> b, Optional<C> c, OfThree<A, B, C, R> make) {
    Optional<Function<C, R>> rest =
        of(a, b, (first, second) -> third -> make.apply(first, second, third));
    return rest.flatMap(f -> c.map(f));
  }

  static <A, B, C, D, R> Optional<R> of(
      Optional<A> a, Optional<B> b, Optional<C> c, Optional<D> d, OfFour<A, B, C, D, R> make) {
    Optional<Function<D, R>> rest =
        of(a, b, c, (first, second, third) -> fourth -> make.apply(first, second, third, fourth));
    return rest.flatMap(f -> d.map(f));
  }
}
