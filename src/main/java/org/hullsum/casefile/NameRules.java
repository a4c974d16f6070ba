package org.hullsum.casefile;

import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.hullsum.expression.Function;

/** Which names a case may give to its parameters and to its volumes, patches and fields. */
final class NameRules {
  /** The variables of the format: names that mean a place, an instant or a surface coordinate. */
  private static final Set<String> COORDINATES =
      Set.of("x", "y", "z", "t", "r", "s", "u", "v", "theta", "polar", "azimuth");

  private static final Set<String> WORDS = Set.of("pi", "e", "if", "and", "or", "not");
  private static final int LONGEST = 200;

  private NameRules() {}

  /** What is wrong with a parameter's name, if anything. */
  static Optional<String> faultOfParameter(String name) {
    if (!name.codePoints().allMatch(c -> Character.isLetterOrDigit(c) || c == '_')
        || name.isEmpty()
        || Character.isDigit(name.codePointAt(0))) {
      return Optional.of("such a name is made of letters, digits and _, and begins with no digit");
    }
    if (COORDINATES.contains(name)) {
      return Optional.of("it is a coordinate; so are " + sorted(COORDINATES));
    }
    if (Function.named(name).isPresent() || WORDS.contains(name)) {
      return Optional.of("it is a function, a constant or an operator of formulas");
    }
    return tooLong(name);
  }

  /** What is wrong with the name of a volume, patch, field or envelope, if anything. */
  static Optional<String> faultOfObject(String name) {
    boolean characters =
        name.codePoints().allMatch(c -> Character.isLetterOrDigit(c) || "-_./".indexOf(c) >= 0);
    if (!characters || name.codePoints().noneMatch(Character::isLetter)) {
      return Optional.of(
          "such a name is made of letters, digits and - _ . / with at least one letter; a `label` may"
              + " hold any text");
    }
    return tooLong(name);
  }

  private static Optional<String> tooLong(String name) {
    return name.length() > LONGEST
        ? Optional.of("a name has at most " + LONGEST + " characters")
        : Optional.empty();
  }

  private static String sorted(Set<String> names) {
    return String.join(" ", new TreeSet<>(names));
  }
}
