package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/** Collects the problems of one file, each once; gives them sorted by place and bounded. */
final class ProblemAccumulator {
  /** How many problems of one file are told one by one. */
  static final int MOST_TOLD = 50;

  /** After so many, what is left of the file is not looked at any more. */
  private static final int MOST_SOUGHT = 200;

  private static final Comparator<Problem> BY_PLACE =
      Comparator.<Problem>comparingInt(p -> p.place().line())
          .thenComparingInt(p -> p.place().column());

  private final Set<Problem> problems = new LinkedHashSet<>();
  private int fatal;

  void add(ProblemKind kind, Place place, String message) {
    Problem problem = new Problem(kind, place, message);
    if (!full() && problems.add(problem)) {
      fatal += kind.fatal() ? 1 : 0;
    }
  }

  /** A fault inside a text, told at the place of the characters at fault. */
  void add(YamlText text, TextFault fault) {
    add(fault.kind(), text.place(fault.start()), fault.getMessage());
  }

  /** Whether enough is wrong to stop looking for more. */
  boolean full() {
    return problems.size() >= MOST_SOUGHT;
  }

  /** How many fatal problems there are so far. */
  int fatalCount() {
    return fatal;
  }

  /** Those that do not. */
  List<Problem> warnings() {
    return bounded(problems.stream().filter(p -> !p.kind().fatal()).sorted(BY_PLACE).toList());
  }

  /** All of them, for a file that can't be audited. */
  List<Problem> all() {
    return bounded(problems.stream().sorted(BY_PLACE).toList());
  }

  private List<Problem> bounded(List<Problem> sorted) {
    if (sorted.size() <= MOST_TOLD) {
      return sorted;
    }
    List<Problem> told = new ArrayList<>(sorted.subList(0, MOST_TOLD));
    Problem last = sorted.get(MOST_TOLD - 1);
    told.add(
        new Problem(
            ProblemKind.LIMIT_EXCEEDED,
            last.place(),
            "and "
                + (full() ? "at least " : "")
                + (sorted.size() - MOST_TOLD)
                + " more problems after this one"));
    return told;
  }
}
