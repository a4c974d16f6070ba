package org.hullsum.casefile;

import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.hullsum.model.Waiver;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.ProblemKind;

/** Reads the findings that are accepted, with the reasons. */
final class WaiverReader {
  private static final List<String> CODES =
      Arrays.stream(FindingCode.values()).map(FindingCode::code).toList();
  private static final Set<String> VERDICTS = Set.of("balanced", "imbalanced", "undecided");

  private final ValueReader values;

  /** The names that a finding can be on. */
  private final Set<String> names;

  WaiverReader(ValueReader values, Set<String> names) {
    this.values = values;
    this.names = names;
  }

  List<Waiver> read(YamlValue value) {
    List<Waiver> waivers = new ArrayList<>();
    for (YamlValue item : ValueReader.oneOrMore(value)) {
      values.section(item, Section.WAIVER).flatMap(this::waiver).ifPresent(waivers::add);
    }
    return waivers;
  }

  private Optional<Waiver> waiver(MapReader map) {
    Optional<FindingCode> code = map.require("finding").flatMap(this::code);
    Optional<String> where = map.require("where").flatMap(this::where);
    Optional<String> because = map.require("because").flatMap(v -> said(v, "`because`"));
    Optional<String> by = map.require("by").flatMap(v -> said(v, "`by`"));
    Optional<LocalDate> until = map.get("until").flatMap(this::date);
    return Together.of(
        code,
        where,
        because,
        by,
        (c, w, reason, who) -> new Waiver(c, w, reason, who, until, map.place()));
  }

  private Optional<FindingCode> code(YamlValue value) {
    Optional<YamlText> text = values.text(value, "`finding`");
    if (text.isPresent() && VERDICTS.contains(text.get().text())) {
      values
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              value.place(),
              "a verdict can't be waived; state a tolerance, or waive the finding behind it");
      return Optional.empty();
    }
    return text.flatMap(t -> values.word(t, "the code of a finding", CODES))
        .map(word -> FindingCode.values()[CODES.indexOf(word)]);
  }

  private Optional<String> where(YamlValue value) {
    Optional<YamlText> text = values.text(value, "`where`");
    if (text.isPresent() && !names.contains(text.get().text())) {
      values
          .problems()
          .add(
              ProblemKind.UNKNOWN_NAME,
              value.place(),
              "there is no patch, volume, field, envelope or parameter "
                  + text.get().shown()
                  + Nearest.hint(text.get().text(), names));
      return Optional.empty();
    }
    return text.map(YamlText::text);
  }

  private Optional<LocalDate> date(YamlValue value) {
    Optional<YamlText> text = values.text(value, "`until`");
    try {
      return text.map(t -> LocalDate.parse(t.text()));
    } catch (DateTimeParseException e) {
      values
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              value.place(),
              "`until` is a date such as 2027-03-31; here is " + value.described());
      return Optional.empty();
    }
  }

  /** A text with something in it: a waiver is somebody's word. */
  private Optional<String> said(YamlValue value, String what) {
    Optional<String> text = values.freeText(value, what);
    if (text.filter(String::isBlank).isPresent()) {
      values.problems().add(ProblemKind.WRONG_VALUE, value.place(), what + " is empty; say it");
      return Optional.empty();
    }
    return text;
  }
}
