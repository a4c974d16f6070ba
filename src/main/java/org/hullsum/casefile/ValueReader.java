package org.hullsum.casefile;

import java.util.List;
import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.Noted;
import org.hullsum.units.Unit;
import org.hullsum.units.UnitParser;

/** Takes a value as what its place needs, a text, a list, a mapping, a unit, or reports it. */
final class ValueReader {
  private final ProblemAccumulator problems;

  ValueReader(ProblemAccumulator problems) {
    this.problems = problems;
  }

  ProblemAccumulator problems() {
    return problems;
  }

  /**
   * The value as a text.
   *
   * @param what what stands here, such as {@code the radius}
   */
  Optional<YamlText> text(YamlValue value, String what) {
    Optional<YamlText> text = value.asText();
    if (text.isEmpty() && !refuseTable(value)) {
      wrongType(value, what, "a text or a number");
    } else if (text.isPresent() && text.get().missing()) {
      problems.add(ProblemKind.MISSING_KEY, value.place(), what + " is missing here");
      return Optional.empty();
    }
    return text;
  }

  Optional<YamlList> list(YamlValue value, String what, String of) {
    Optional<YamlList> list = value.asList();
    if (list.isEmpty() && !refuseTable(value)) {
      wrongType(value, what, "a list " + of);
    }
    return list;
  }

  /** A list of exactly so many items. */
  Optional<List<YamlValue>> items(YamlValue value, int count, String what, String of) {
    Optional<YamlList> list = list(value, what, of);
    if (list.isPresent() && list.get().items().size() != count) {
      problems.add(
          ProblemKind.WRONG_TYPE,
          value.place(),
          what + " is a list " + of + "; here is " + value.described() + commaHint(list.get()));
      return Optional.empty();
    }
    return list.map(YamlList::items);
  }

  private static String commaHint(YamlList list) {
    return list.items().stream()
        .flatMap(item -> item.asText().stream())
        .filter(YamlText::plain)
        .filter(text -> YamlTraps.unbalanced(text.text()))
        .findFirst()
        .map(text -> "; a comma ends an item: put " + text.shown() + " … in quotes")
        .orElse("");
  }

  Optional<YamlMap> map(YamlValue value, String what, String of) {
    Optional<YamlMap> map = value.asMap();
    if (map.isEmpty()) {
      wrongType(value, what, "a mapping " + of);
    }
    return map;
  }

  /** The value as a mapping of a section, its keys checked. */
  Optional<MapReader> section(YamlValue value, Section section) {
    Optional<YamlMap> map = value.asMap();
    if (map.isEmpty()) {
      wrongType(value, section.title(), "a mapping with " + keysOf(section));
    }
    return map.map(m -> MapReader.of(m, section, problems));
  }

  private static String keysOf(Section section) {
    return section.keys().size() == 1
        ? "the key " + String.join("", section.keys())
        : "keys of " + String.join(", ", section.keys());
  }

  /** The items of a list, or the one value that is none. */
  static List<YamlValue> oneOrMore(YamlValue value) {
    return value.asList().map(YamlList::items).orElse(List.of(value));
  }

  /** A text for people; warned of where YAML probably cut it. */
  Optional<String> freeText(YamlValue value, String what) {
    Optional<YamlText> text = text(value, what);
    text.ifPresent(t -> YamlTraps.warn(t, problems));
    return text.map(t -> t.text().strip());
  }

  Optional<Boolean> flag(YamlValue value, String what) {
    Optional<YamlText> text = text(value, what);
    if (text.isPresent() && !List.of("true", "false").contains(text.get().text())) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          value.place(),
          what + " is `true` or `false`; here is " + value.described());
      return Optional.empty();
    }
    return text.map(t -> t.text().equals("true"));
  }

  /** A unit with the notes of how it was read. */
  Optional<Noted<Unit>> unit(YamlValue value, String what) {
    Optional<YamlText> text = text(value, what);
    if (text.isEmpty()) {
      return Optional.empty();
    }
    try {
      return Optional.of(UnitParser.parseWithNotes(text.get().text()));
    } catch (TextFault fault) {
      problems.add(text.get(), fault);
      return Optional.empty();
    }
  }

  /** One of a few words, reported with the nearest where it is another. */
  Optional<String> word(YamlText text, String what, List<String> words) {
    if (words.contains(text.text())) {
      return Optional.of(text.text());
    }
    problems.add(
        ProblemKind.WRONG_VALUE,
        text.place(),
        what
            + " is one of "
            + String.join(", ", words)
            + "; here is "
            + text.described()
            + Nearest.hint(text.text(), words)
            + YamlTraps.hint(text));
    return Optional.empty();
  }

  private boolean refuseTable(YamlValue value) {
    Optional<YamlMap.Entry> file = value.asMap().flatMap(m -> m.entry("file"));
    file.ifPresent(
        entry ->
            problems.add(
                ProblemKind.NOT_SUPPORTED,
                entry.key().place(),
                "a table reference (`file`) is not supported yet"));
    return file.isPresent();
  }

  void wrongType(YamlValue value, String what, String expected) {
    String hint = value.asText().map(YamlTraps::hint).orElse("");
    if (value.asText().filter(YamlText::missing).isPresent()) {
      problems.add(ProblemKind.MISSING_KEY, value.place(), what + " is missing; it is " + expected);
      return;
    }
    problems.add(
        ProblemKind.WRONG_TYPE,
        value.place(),
        what + " is " + expected + "; here is " + value.described() + hint);
  }
}
