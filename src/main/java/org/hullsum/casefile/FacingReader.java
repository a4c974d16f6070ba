package org.hullsum.casefile;

import java.util.List;
import java.util.Optional;
import org.hullsum.model.Facing;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.ProblemKind;

/** Reads which way a patch's normal is declared to point. */
final class FacingReader {
  private static final List<String> WORDS =
      List.of("as-drawn", "reversed", "outward", "upward", "downward");
  private static final List<String> KEYS = List.of("along", "away-from");

  private final FormulaReader formulas;
  private final ValueReader values;

  FacingReader(FormulaReader formulas) {
    this.formulas = formulas;
    this.values = formulas.values();
  }

  Optional<Facing> read(YamlValue value) {
    Optional<YamlText> text = value.asText();
    if (text.isPresent()) {
      return word(text.get());
    }
    Optional<MapReader> section = values.section(value, Section.FACING);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = section.get();
    List<String> present = map.present(KEYS);
    if (present.size() != 1) {
      if (!map.faulty()) {
        values
            .problems()
            .add(
                ProblemKind.WRONG_VALUE,
                value.place(),
                "`facing` is one of along and away-from; here are " + present.size());
      }
      return Optional.empty();
    }
    if (present.get(0).equals("along")) {
      return map.get("along")
          .flatMap(v -> formulas.direction(v, "`along`"))
          .map(direction -> new Facing.Along(direction, "along " + written(direction)));
    }
    return map.get("away-from")
        .flatMap(v -> formulas.point(v, "`away-from`"))
        .flatMap(formulas::value)
        .map(point -> new Facing.AwayFrom(point, "away-from " + written(point)));
  }

  private Optional<Facing> word(YamlText text) {
    return values
        .word(text, "`facing` (or {along: VECTOR}, {away-from: POINT})", WORDS)
        .map(
            word ->
                switch (word) {
                  case "reversed" -> new Facing.Reversed();
                  case "outward" -> new Facing.Outward();
                  case "upward" -> new Facing.Along(Vector3.Z, word);
                  case "downward" -> new Facing.Along(Vector3.Z.negated(), word);
                  default -> new Facing.AsDrawn();
                });
  }

  private static String written(Vector3 v) {
    return "[" + v.x() + ", " + v.y() + ", " + v.z() + "]";
  }
}
